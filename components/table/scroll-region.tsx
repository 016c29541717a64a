'use client';

import { type ReactNode, useEffect, useRef, useState } from 'react';
import { BreakLine } from './break-line';

/** Scrolls sideways by itself where its content is too wide, shows a break line where more lies, and can be reached by keyboard. */
export function ScrollRegion({ children }: { children: ReactNode }) {
  const ref = useRef<HTMLDivElement>(null);
  const [more, setMore] = useState({ left: false, right: false });
  useEffect(() => {
    const element = ref.current;
    if (!element) return;
    const look = () => {
      const { scrollLeft, scrollWidth, clientWidth } = element;
      setMore({ left: scrollLeft > 1, right: scrollWidth - clientWidth - scrollLeft > 1 });
    };
    const observer = new ResizeObserver(look);
    observer.observe(element);
    for (const child of element.children) observer.observe(child);
    element.addEventListener('scroll', look, { passive: true });
    return () => {
      observer.disconnect();
      element.removeEventListener('scroll', look);
    };
  }, []);
  const scrolls = more.left || more.right;
  return (
    <div className="relative max-w-full">
      <div ref={ref} className="relative overflow-x-auto" {...(scrolls ? { tabIndex: 0 } : {})}>
        {children}
      </div>
      {more.left ? <BreakLine side="left" /> : null}
      {more.right ? <BreakLine side="right" /> : null}
    </div>
  );
}
