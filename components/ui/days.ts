/**
 * Days and times as this product writes them for everybody: the day, then the month in words, 24 hours. A time zone
 * that is left out is that of whoever looks.
 */
const WRITTEN = 'en-GB';

/** A day with its year: `9 December 2026`; where today is given, the year only if it is another. */
export function sayDay(day: string, today?: string): string {
  return write(atNoon(day), 'UTC', 'long', today?.slice(0, 4) !== day.slice(0, 4));
}

/** The same where there is little room: `9 Dec`. */
export function sayShortDay(day: string, today: string): string {
  return write(atNoon(day), 'UTC', 'short', today.slice(0, 4) !== day.slice(0, 4));
}

/** A day as it is said in class: `Friday, 4 December`. */
export function sayWeekday(day: string): string {
  const weekday = new Intl.DateTimeFormat(WRITTEN, { timeZone: 'UTC', weekday: 'long' }).format(atNoon(day));
  return `${weekday}, ${write(atNoon(day), 'UTC', 'long', false)}`;
}

/** The day of a moment, with the year unless it is this one: `9 December`. */
export function sayDayOf(moment: string, timeZone?: string, now: Date = new Date()): string {
  const at = new Date(moment);
  return write(at, timeZone, 'long', yearOf(at, timeZone) !== yearOf(now, timeZone));
}

/** The same where there is little room: `9 Dec`. */
export function sayShortDayOf(moment: string, timeZone?: string): string {
  return write(new Date(moment), timeZone, 'short', false);
}

/** `14:05` */
export function sayTime(moment: string, timeZone?: string): string {
  const style = { timeZone, hour: '2-digit', minute: '2-digit', hourCycle: 'h23' } as const;
  return new Intl.DateTimeFormat(WRITTEN, style).format(new Date(moment));
}

/** A moment, with the year unless it is this one: `9 December, 14:05`. */
export function sayMoment(moment: string, timeZone?: string, now: Date = new Date()): string {
  return `${sayDayOf(moment, timeZone, now)}, ${sayTime(moment, timeZone)}`;
}

function atNoon(day: string): Date {
  return new Date(`${day}T12:00:00Z`);
}

function yearOf(at: Date, timeZone: string | undefined): string {
  return new Intl.DateTimeFormat(WRITTEN, { timeZone, year: 'numeric' }).format(at);
}

function write(at: Date, timeZone: string | undefined, month: 'long' | 'short', withYear: boolean): string {
  const year = withYear ? ({ year: 'numeric' } as const) : {};
  return new Intl.DateTimeFormat(WRITTEN, { timeZone, day: 'numeric', month, ...year }).format(at);
}
