'use client';

import { useState, useTransition } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { signOutAction } from '../actions';

/** Readings of this person that are on this device alone; none where the device has no store. */
async function countUnsent(personId: string): Promise<number> {
  try {
    const { deviceStore } = await import('@/lib/sync/client/device-store');
    return await deviceStore().outbox.where('authorId').equals(personId).count();
  } catch {
    return 0;
  }
}

/** Signs out, but says first when readings of this person still wait on the device. */
export function SignOut({ personId }: { personId: string }) {
  const [unsent, setUnsent] = useState(0);
  const [pending, startTransition] = useTransition();
  const leave = () => startTransition(() => signOutAction());

  function askFirst() {
    startTransition(async () => {
      const found = await countUnsent(personId);
      if (found === 0) await signOutAction();
      else setUnsent(found);
    });
  }

  return (
    <>
      <Button onClick={askFirst} disabled={pending} aria-busy={pending}>
        sign out
      </Button>
      <Dialog
        open={unsent > 0}
        onOpenChange={() => setUnsent(0)}
        title={unsent === 1 ? 'One reading is not sent yet' : `${unsent} readings are not sent yet`}
        description="They stay on this device. Only your own sign-in on this device can send them."
      >
        <div className="flex flex-wrap justify-end gap-2">
          <Button onClick={() => setUnsent(0)}>stay signed in</Button>
          <Button kind="act" onClick={leave} disabled={pending}>
            sign out all the same
          </Button>
        </div>
      </Dialog>
    </>
  );
}
