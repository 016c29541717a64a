'use client';

import { useActionState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { LocalTime } from '@/components/ui/local-time';
import { Refusal } from '@/components/ui/refusal';
import { SubmitButton } from '@/components/ui/submit-button';

/** The reason once it was asked for, or why it cannot be shown. */
export type ReasonReply =
  | { refused: string }
  | { reason: string; writtenBy: string; writtenAt: string }
  | undefined;

interface ReadReasonPressProps {
  accommodationId: string;
  /** Whose rubric is modified. */
  name: string;
  action: (reply: ReasonReply, data: FormData) => Promise<ReasonReply>;
}

/** Why a rubric is modified, behind a press of its own that says that the look is logged. */
export function ReadReasonPress({ accommodationId, name, action }: ReadReasonPressProps) {
  return (
    <Dialog
      trigger={
        <Button size="small">
          reason<span className="sr-only"> for {name}</span>
        </Button>
      }
      title={`The reason, ${name}`}
    >
      <Reason accommodationId={accommodationId} action={action} />
    </Dialog>
  );
}

function Reason({ accommodationId, action }: Omit<ReadReasonPressProps, 'name'>) {
  const [reply, send] = useActionState(action, undefined);
  if (reply && 'reason' in reply) {
    return (
      <div className="grid gap-4">
        <p className="break-words whitespace-pre-wrap">{reply.reason}</p>
        <p className="text-label text-ink-2">
          Written by {reply.writtenBy}, <LocalTime at={reply.writtenAt} style="day" />. Your look is in the
          access log.
        </p>
      </div>
    );
  }
  return (
    <form action={send} className="grid gap-4">
      <input type="hidden" name="accommodationId" value={accommodationId} />
      <p className="max-w-[56ch]">
        The reason is kept apart from scores. Reading it is logged: the access log keeps that you read it,
        when, and for whom.
      </p>
      {reply ? <Refusal title={reply.refused} /> : null}
      <div>
        <SubmitButton pendingLabel="reading">read the reason</SubmitButton>
      </div>
    </form>
  );
}
