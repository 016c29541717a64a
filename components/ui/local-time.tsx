'use client';

import { format } from 'date-fns';
import { useSyncExternalStore } from 'react';
import { sayDay, sayTime } from './days';

/** The day has its year: it stands in lists that go back far. */
const STYLES = {
  time: (at: string) => sayTime(at),
  day: (at: string) => sayDay(format(new Date(at), 'yyyy-MM-dd')),
};

const never = () => () => {};

/** A moment by the clock of whoever looks; before the browser knows, the day alone. */
export function LocalTime({ at, style = 'time' }: { at: string; style?: keyof typeof STYLES }) {
  const inBrowser = useSyncExternalStore(
    never,
    () => true,
    () => false,
  );
  const text = inBrowser ? STYLES[style](at) : at.slice(0, 10);
  return <time dateTime={at}>{text}</time>;
}
