/** A bare number or letter gets the word before it; whoever typed the word has it already. */
export function sayPeriod(period: string): string {
  return /^period\b/i.test(period) ? period : `period ${period}`;
}

/** "period 3", "periods 3, 5 and 6" */
export function sayPeriods(periods: readonly string[]): string {
  const [first = ''] = periods;
  if (periods.length === 1) return sayPeriod(first);
  const last = periods.at(-1) ?? '';
  return `periods ${periods.slice(0, -1).join(', ')} and ${last}`;
}

export function count(number: number, one: string, many: string): string {
  return number === 1 ? `1 ${one}` : `${number} ${many}`;
}

/** Hundredths as they stand in a table: one decimal. */
export function tenths(hundredths: number): string {
  return (Math.abs(hundredths) / 100).toFixed(1);
}

/** A change with its sign: "+1.2", "−0.4", "0.0". */
export function signedTenths(hundredths: number): string {
  if (Math.round(hundredths / 10) === 0) return '0.0';
  return `${hundredths < 0 ? '−' : '+'}${tenths(hundredths)}`;
}
