'use client';

import { useSyncExternalStore } from 'react';

const WIDE = '(min-width: 64rem)';

/** Whether the page is as wide as a tablet on its side, or wider. */
export function useWide(): boolean {
  return useSyncExternalStore(
    (listener) => {
      const query = window.matchMedia(WIDE);
      query.addEventListener('change', listener);
      return () => query.removeEventListener('change', listener);
    },
    () => window.matchMedia(WIDE).matches,
    () => true,
  );
}
