/** A day as people write it: `24 August 2026`. */
export function sayDay(day: string): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'long', timeZone: 'UTC' }).format(
    new Date(`${day}T00:00:00Z`),
  );
}

/** A moment on the school's own clock: `1 Dec 2026, 14:05`. */
export function sayMoment(moment: string, timeZone: string): string {
  return new Intl.DateTimeFormat('en-GB', { dateStyle: 'medium', timeStyle: 'short', timeZone }).format(
    new Date(moment),
  );
}
