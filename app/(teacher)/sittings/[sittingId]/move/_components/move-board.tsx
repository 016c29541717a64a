'use client';

import { useRouter } from 'next/navigation';
import { type ReactNode, useState } from 'react';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { Refusal } from '@/components/ui/refusal';
import type { MovePreview } from '@/lib/contracts/moves';
import { type MoveReply, moveSittingAction } from '../actions';
import { Looking } from './looking';
import { MoveDecision } from './move-decision';
import { MoveDrawing } from './move-drawing';
import { MoveTable } from './move-table';
import { MoveVerdict } from './move-verdict';
import { moversOf, pictureWords } from './move-words';
import { usePreview } from './use-preview';

interface MoveBoardProps {
  sittingId: string;
  versionId: string;
  toNumber: number;
  published: boolean;
  /** What the version changes, above the verdict. */
  head: ReactNode;
  history: ReactNode;
}

/** One version looked at: who would move, and the press that moves the sitting to it. */
export function MoveBoard({ sittingId, versionId, toNumber, published, head, history }: MoveBoardProps) {
  const { state, stop, again } = usePreview(sittingId, versionId);
  const router = useRouter();
  const [held, setHeld] = useState<boolean | null>(null);
  const [reply, setReply] = useState<MoveReply | null>(null);

  async function move(preview: MovePreview, holdHarmless: boolean) {
    const data = { sittingId, versionId, holdHarmless, seen: preview.seen };
    const answer = await moveSittingAction(data).catch(() => UNANSWERED);
    setReply(answer);
    if (answer.kind === 'moved') router.push(`/sittings/${sittingId}`);
    if (answer.kind === 'stale') again();
  }

  const preview = state.kind === 'ready' ? state.preview : null;
  return (
    <div className="grid items-start gap-x-10 gap-y-8 lg:grid-cols-[minmax(0,1fr)_20rem] xl:grid-cols-[minmax(0,1fr)_25rem_19rem]">
      <div className="grid gap-5 xl:col-span-2">
        {head}
        {state.kind === 'ready' ? (
          <MoveVerdict preview={state.preview} />
        ) : (
          <Looking state={state} toNumber={toNumber} stop={stop} again={again} />
        )}
      </div>
      {preview && preview.gain + preview.lose + preview.same > 0 ? (
        <div className="lg:col-start-1">
          <MoveDrawing
            movers={moversOf(preview.students)}
            total={preview.to.total}
            held={held === true}
            label={pictureWords(preview)}
          />
        </div>
      ) : null}
      <div className="max-lg:contents lg:col-start-2 lg:row-span-3 lg:row-start-1 lg:grid lg:gap-8 xl:col-start-3">
        <Answered reply={reply} />
        {preview ? (
          <MoveDecision
            preview={preview}
            published={published}
            held={held}
            onHeld={setHeld}
            onMove={(holdHarmless) => move(preview, holdHarmless)}
          />
        ) : null}
        <div className="max-lg:order-last">{history}</div>
      </div>
      {preview && preview.students.length > 0 ? (
        <div className="lg:col-start-1 xl:col-start-2 xl:row-start-2">
          <MoveTable preview={preview} />
        </div>
      ) : null}
    </div>
  );
}

const UNANSWERED: MoveReply = {
  kind: 'refused',
  message: 'The server does not answer. Whether the sitting was moved shows when you load this page again.',
  signedOut: false,
};

/** What came of the press when the sitting was not moved. */
function Answered({ reply }: { reply: MoveReply | null }) {
  if (!reply || reply.kind === 'moved') return null;
  if (reply.kind === 'stale') {
    return (
      <Notice title="Something changed since you looked.">
        Nothing was moved. The preview is made again, and your choice is kept: look at it and press once more.
      </Notice>
    );
  }
  return (
    <Refusal
      title={reply.message}
      action={reply.signedOut ? <LinkButton href="/sign-in">sign in</LinkButton> : undefined}
    >
      {reply.signedOut ? 'Nothing was moved. Sign in, and come back to this page.' : null}
    </Refusal>
  );
}
