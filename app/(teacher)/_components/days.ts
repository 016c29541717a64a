/** A day as people write it where room is short: `9 December`, with the year unless it is this one. */
export function sayDay(day: string, today: string): string {
  return write(new Date(`${day}T00:00:00Z`), 'UTC', day.slice(0, 4) !== today.slice(0, 4));
}

/** The day of a moment by the school's own clock. */
export function sayDayOf(moment: string, timeZone: string, now: Date = new Date()): string {
  const at = new Date(moment);
  return write(at, timeZone, at.getUTCFullYear() !== now.getUTCFullYear());
}

/** The same where there is little room: `9 Dec`. */
export function sayShortDayOf(moment: string, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', { timeZone, day: 'numeric', month: 'short' }).format(
    new Date(moment),
  );
}

/** A moment by the school's own clock: `9 December, 14:05`. */
export function sayMoment(moment: string, timeZone: string, now: Date = new Date()): string {
  const time = new Intl.DateTimeFormat('en-GB', { timeZone, hour: '2-digit', minute: '2-digit' });
  return `${sayDayOf(moment, timeZone, now)}, ${time.format(new Date(moment))}`;
}

function write(at: Date, timeZone: string, withYear: boolean): string {
  return new Intl.DateTimeFormat('en-GB', {
    timeZone,
    day: 'numeric',
    month: 'long',
    ...(withYear ? { year: 'numeric' } : {}),
  }).format(at);
}
