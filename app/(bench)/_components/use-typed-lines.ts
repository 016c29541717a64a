'use client';

import { useEffect, useEffectEvent, useRef, useState } from 'react';

/** What an instrument, or a person at a keyboard, can type of a length. */
const TYPED = /^[0-9.,/+\-"'a-z½¼¾⅛⅜⅝⅞]$/i;
const BEGINS = /^[0-9.,+-]$/;

/** Digits that stand longer than this without an Enter belong to nothing. */
const FORGET_AFTER_MS = 5_000;

/**
 * Lines typed anywhere on the page, for an instrument that needs no focused box: digits, then Enter or Tab.
 * Returns what has been typed so far.
 */
export function useTypedLines(active: boolean, onLine: (text: string, at: number) => void): string {
  const [text, setText] = useState('');
  const typed = useRef({ text: '', at: 0 });
  const line = useEffectEvent(onLine);

  useEffect(() => {
    if (!active) return;
    const put = (next: string) => {
      typed.current = { text: next, at: performance.now() };
      setText(next);
    };
    const onKey = (event: KeyboardEvent) => {
      if (event.ctrlKey || event.metaKey || event.altKey || isField(event.target)) return;
      const stale = performance.now() - typed.current.at > FORGET_AFTER_MS;
      const sofar = stale ? '' : typed.current.text;
      if ((event.key === 'Enter' || event.key === 'Tab') && sofar !== '') {
        event.preventDefault();
        put('');
        line(sofar, performance.now());
      } else if (event.key === 'Escape' && sofar !== '') put('');
      else if (event.key === 'Backspace' && sofar !== '') put(sofar.slice(0, -1));
      else if (event.key === ' ' && sofar !== '') {
        event.preventDefault();
        put(`${sofar} `);
      } else if (sofar === '' ? BEGINS.test(event.key) : TYPED.test(event.key)) {
        event.preventDefault();
        put(sofar + event.key);
      }
    };
    document.addEventListener('keydown', onKey, { capture: true });
    return () => document.removeEventListener('keydown', onKey, { capture: true });
  }, [active]);

  return active ? text : '';
}

function isField(target: EventTarget | null): boolean {
  return target instanceof HTMLElement && target.closest('input, textarea, select') !== null;
}
