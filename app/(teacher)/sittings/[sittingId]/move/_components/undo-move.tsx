'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { LinkButton } from '@/components/ui/link-button';
import { Refusal } from '@/components/ui/refusal';
import type { MoveMade } from '@/lib/contracts/moves';
import { type MoveReply, undoMoveAction } from '../actions';

interface UndoMoveProps {
  sittingId: string;
  move: MoveMade;
}

const UNANSWERED: MoveReply = {
  kind: 'refused',
  message: 'The server does not answer. Load the page again to see whether the move was undone.',
  signedOut: false,
};

/** Takes a move back, until the next publication. */
export function UndoMove({ sittingId, move: { moveId, from, to } }: UndoMoveProps) {
  const [reply, setReply] = useState<MoveReply | null>(null);

  async function undo() {
    setReply(await undoMoveAction({ sittingId, moveId }).catch(() => UNANSWERED));
  }

  return (
    <>
      <ConfirmDialog
        trigger={
          <Button kind="quiet" size="small" className="px-0">
            undo the move
          </Button>
        }
        title={`Back to version ${from}?`}
        confirmLabel={`back to version ${from}`}
        kind="act"
        action={undo}
      >
        <p>
          Every score becomes again what version {from} gives. No reading is touched, students are told
          nothing, and you can move to version {to} once more whenever you want.
        </p>
      </ConfirmDialog>
      {reply?.kind === 'refused' ? (
        <Refusal
          title={reply.message}
          action={reply.signedOut ? <LinkButton href="/sign-in">sign in</LinkButton> : undefined}
        >
          The move stands as it is.
        </Refusal>
      ) : null}
    </>
  );
}
