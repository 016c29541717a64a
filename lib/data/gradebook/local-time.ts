/**
 * A moment as ISO 8601 by the clocks of a time zone, with its offset from UTC, to the second.
 * @example localTime(new Date('2026-03-24T15:42:00Z'), 'America/Chicago') // '2026-03-24T10:42:00-05:00'
 */
export function localTime(moment: Date, timeZone: string): string {
  const parts = new Intl.DateTimeFormat('en-CA', {
    timeZone,
    calendar: 'gregory',
    numberingSystem: 'latn',
    year: 'numeric',
    month: '2-digit',
    day: '2-digit',
    hour: '2-digit',
    minute: '2-digit',
    second: '2-digit',
    hourCycle: 'h23',
    timeZoneName: 'longOffset',
  }).formatToParts(moment);
  const at = (type: Intl.DateTimeFormatPartTypes) => parts.find((part) => part.type === type)?.value ?? '';
  const offset = at('timeZoneName').replace('GMT', '').replace('\u{2212}', '-');
  const day = `${at('year').padStart(4, '0')}-${at('month')}-${at('day')}`;
  return `${day}T${at('hour')}:${at('minute')}:${at('second')}${offset === '' ? '+00:00' : offset}`;
}
