'use client';

import { type ReactNode, useEffect, useRef } from 'react';

/**
 * What stays in view beside a long sheet: it takes the whole column, so that nothing scrolls under it, and where
 * it is taller than the window its lower end is the one that stays.
 */
export function KeptInView({ children }: { children: ReactNode }) {
  const box = useRef<HTMLDivElement>(null);
  useEffect(() => {
    const element = box.current;
    if (!element) return;
    const place = () => {
      element.style.top = `${Math.min(0, window.innerHeight - element.offsetHeight)}px`;
    };
    const watch = new ResizeObserver(place);
    watch.observe(element);
    window.addEventListener('resize', place);
    return () => {
      watch.disconnect();
      window.removeEventListener('resize', place);
    };
  }, []);
  return (
    <div className="min-w-0 xl:flex-1">
      <div ref={box} className="xl:sticky xl:top-0 xl:pb-8">
        {children}
      </div>
    </div>
  );
}
