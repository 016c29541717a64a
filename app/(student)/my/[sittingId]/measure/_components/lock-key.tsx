'use client';

import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import type { OwnRecord } from '@/lib/practicals/own-record';

interface LockKeyProps {
  left: number;
  record: OwnRecord;
  onLock: () => Promise<boolean>;
}

/** Locks the readings once nothing is left, and says first what that means. */
export function LockKey({ left, record, onLock }: LockKeyProps) {
  if (left > 0) {
    return (
      <Button
        notYet={`${left === 1 ? 'one size is' : `${left} sizes are`} neither recorded nor marked “couldn’t read”`}
      >
        lock
      </Button>
    );
  }
  const unreadable = record.derived.unreadable.length;
  return (
    <ConfirmDialog
      trigger={<Button kind="act">lock my readings</Button>}
      title="Lock your readings?"
      kind="act"
      confirmLabel="lock them"
      cancelLabel="not yet"
      action={onLock}
    >
      <p>
        You commit to what you read. After this you cannot change anything; your teacher can reopen it until
        the bench has its first reading of your pieces.
      </p>
      <p className="mt-2">
        You get a receipt to show when your pieces are picked up, and see your predicted score.
        {unreadable > 0
          ? ` ${unreadable === 1 ? 'One size is' : `${unreadable} sizes are`} marked “couldn’t read”.`
          : ''}
      </p>
    </ConfirmDialog>
  );
}
