'use client';

import { useEffect, useState } from 'react';

/** How many readings wait on this device for their person to sign in and send them. */
export function UnsentCount() {
  const [count, setCount] = useState(0);
  useEffect(() => {
    let gone = false;
    import('@/lib/sync/client/device-store')
      .then(({ deviceStore }) => deviceStore().outbox.count())
      .then((found) => {
        if (!gone) setCount(found);
      })
      .catch(() => {});
    return () => {
      gone = true;
    };
  }, []);
  return <span aria-live="polite">{count === 0 ? 'none' : `${count}, kept until sent`}</span>;
}
