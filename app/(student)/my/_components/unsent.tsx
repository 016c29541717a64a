'use client';

import { useEffect, useState } from 'react';
import { Notice } from '@/components/ui/notice';
import { deviceStore } from '@/lib/sync/client/device-store';
import { sendUnsent } from '@/lib/sync/client/send-unsent';
import { type UnsentCount, watchUnsent } from '@/lib/sync/client/watch-unsent';

/** Own readings that still wait on this device: sent from here as well, and said as long as they wait. */
export function Unsent({ personId }: { personId: string }) {
  const [{ waiting, refused }, setCount] = useState<UnsentCount>({ waiting: 0, refused: 0, others: 0 });
  useEffect(() => {
    const stop = watchUnsent(deviceStore(), personId, setCount);
    const halt = sendUnsent(personId);
    return () => {
      stop();
      halt();
    };
  }, [personId]);
  if (waiting + refused === 0) return null;
  return (
    <Notice
      title={
        waiting + refused === 1
          ? 'One entry waits on this device'
          : `${waiting + refused} entries wait on this device`
      }
      className="mt-4"
    >
      {waiting > 0 ? 'They are sent by themselves as soon as there is a network. ' : ''}
      {refused > 0
        ? `${refused} ${refused === 1 ? 'was' : 'were'} not taken: open your readings, and the reason is there. `
        : ''}
      Do not clear this browser’s data.
    </Notice>
  );
}
