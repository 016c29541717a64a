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
