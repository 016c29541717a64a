/** `Woods 2, period 3`. */
export function saySection({ name, period }: { name: string; period: string }): string {
  return `${name}, ${sayPeriod(period)}`;
}

/** A bare number or letter gets the word before it; one who typed the word has it already. */
export function sayPeriod(period: string): string {
  return /^period\b/i.test(period) ? period : `period ${period}`;
}

export function sayStudents(count: number): string {
  if (count === 0) return 'no students';
  return count === 1 ? 'one student' : `${count} students`;
}

export function sayName({ familyName, givenName }: { familyName: string; givenName: string }): string {
  return [familyName, givenName].filter(Boolean).join(', ');
}

/** A day as people write it: `9 December 2026`. */
export function sayDay(day: string): string {
  return formatDay(day, { dateStyle: 'long' });
}

/** The same where there is little room: `9 Dec`, with the year unless it is this one. */
export function sayShortDay(day: string, today: string): string {
  const sameYear = day.slice(0, 4) === today.slice(0, 4);
  return formatDay(day, { day: 'numeric', month: 'short', ...(sameYear ? {} : { year: 'numeric' }) });
}

function formatDay(day: string, style: Intl.DateTimeFormatOptions): string {
  return new Intl.DateTimeFormat('en-GB', { ...style, timeZone: 'UTC' }).format(new Date(`${day}T00:00:00Z`));
}
