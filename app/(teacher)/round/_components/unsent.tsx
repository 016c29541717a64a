'use client';

import { useEffect, useState } from 'react';
import { Notice } from '@/components/ui/notice';
import { deviceStore } from '@/lib/sync/client/device-store';
import { sendUnsent } from '@/lib/sync/client/send-unsent';
import { type UnsentCount, watchUnsent } from '@/lib/sync/client/watch-unsent';

/** Readings of earlier rounds that still wait on this device: sent from here as well, and never forgotten silently. */
export function Unsent({ personId }: { personId: string }) {
  const [count, setCount] = useState<UnsentCount>({ waiting: 0, refused: 0, others: 0 });
  useEffect(() => {
    const stop = watchUnsent(deviceStore(), personId, setCount);
    const halt = sendUnsent(personId);
    return () => {
      stop();
      halt();
    };
  }, [personId]);
  const { waiting, refused, others } = count;
  if (waiting + refused + others === 0) return null;
  return (
    <div className="mb-6">
      <Notice title={`${waiting + refused + others} readings wait on this device`}>
        {waiting > 0 ? `${waiting} of yours are sent as soon as there is a network. ` : ''}
        {refused > 0 ? `${refused} were refused: open their round and look under “kept”. ` : ''}
        {others > 0 ? `${others} were made by somebody else, who has to sign in here to send them. ` : ''}
        Do not clear this browser’s data.
      </Notice>
    </div>
  );
}
