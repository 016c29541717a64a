'use client';

import { useActionState } from 'react';
import { Refusal } from '@/components/ui/refusal';
import { SubmitButton } from '@/components/ui/submit-button';
import { bringBackAction, markLeftAction, resendInvitationAction } from '../actions';

const PRESSES = {
  resend: { action: resendInvitationAction, label: 'send the invitation again' },
  back: { action: bringBackAction, label: 'bring back' },
  left: { action: markLeftAction, label: 'mark as left' },
};

/** One button of a person's sheet, and what came of it. */
export function Press({ what, personId }: { what: keyof typeof PRESSES; personId: string }) {
  const { action, label } = PRESSES[what];
  const [reply, send] = useActionState(action, undefined);
  return (
    <form action={send} className="grid gap-2">
      <input type="hidden" name="personId" value={personId} />
      <div>
        <SubmitButton kind="plain">{label}</SubmitButton>
      </div>
      {reply && 'refused' in reply ? <Refusal title={reply.refused} /> : null}
      <p role="status" className="text-label text-ink-2 empty:hidden">
        {reply && 'done' in reply ? reply.done : null}
      </p>
    </form>
  );
}
