'use client';

import { useEffect, useEffectEvent } from 'react';

/** Calls back when nobody has touched the page for so many minutes; time that the page slept counts. */
export function useIdle(active: boolean, minutes: number, onIdle: () => void): void {
  const idle = useEffectEvent(onIdle);
  useEffect(() => {
    if (!active) return;
    let touchedAt = Date.now();
    const touch = () => {
      touchedAt = Date.now();
    };
    const timer = setInterval(() => {
      if (Date.now() - touchedAt >= minutes * 60_000) idle();
    }, 1_000);
    document.addEventListener('pointerdown', touch, { capture: true });
    document.addEventListener('keydown', touch, { capture: true });
    return () => {
      clearInterval(timer);
      document.removeEventListener('pointerdown', touch, { capture: true });
      document.removeEventListener('keydown', touch, { capture: true });
    };
  }, [active, minutes]);
}
