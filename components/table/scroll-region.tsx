'use client';

import { type ReactNode, useEffect, useRef, useState } from 'react';

/** Scrolls sideways by itself where its content is too wide, and can then be reached by keyboard. */
export function ScrollRegion({ children }: { children: ReactNode }) {
  const ref = useRef<HTMLDivElement>(null);
  const [scrolls, setScrolls] = useState(false);
  useEffect(() => {
    const element = ref.current;
    if (!element) return;
    const observer = new ResizeObserver(() => setScrolls(element.scrollWidth > element.clientWidth + 1));
    observer.observe(element);
    return () => observer.disconnect();
  }, []);
  return (
    <div ref={ref} className="relative max-w-full overflow-x-auto" {...(scrolls ? { tabIndex: 0 } : {})}>
      {children}
    </div>
  );
}
