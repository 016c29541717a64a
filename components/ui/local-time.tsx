'use client';

import { useSyncExternalStore } from 'react';

const STYLES = {
  time: { hour: '2-digit', minute: '2-digit', hourCycle: 'h23' },
  day: { day: 'numeric', month: 'long', year: 'numeric' },
} as const;

const never = () => () => {};

/** A moment by the clock of whoever looks; before the browser knows, the day alone. */
export function LocalTime({ at, style = 'time' }: { at: string; style?: keyof typeof STYLES }) {
  const inBrowser = useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
  const text = inBrowser
    ? new Intl.DateTimeFormat('en-GB', STYLES[style]).format(new Date(at))
    : at.slice(0, 10);
  return <time dateTime={at}>{text}</time>;
}
