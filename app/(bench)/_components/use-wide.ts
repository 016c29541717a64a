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

const MARGINS_PX = 36;

/** How many px the bench is wide, inside its margins. */
export function useBenchWidth(): number {
  return useSyncExternalStore(
    (listener) => {
      window.addEventListener('resize', listener);
      return () => window.removeEventListener('resize', listener);
    },
    () => window.innerWidth - MARGINS_PX,
    () => 1144,
  );
}
