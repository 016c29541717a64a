import { describe, expect, it } from 'vitest';
import {
  sayDay,
  sayDayOf,
  sayMoment,
  sayShortDay,
  sayShortDayOf,
  sayTime,
  sayWeekday,
} from '@/components/ui/days';

const NOW = new Date('2026-12-01T15:00:00Z');

describe('a day', () => {
  it('has its year, but where today is known only if that is another', () => {
    expect(sayDay('2026-12-09')).toBe('9 December 2026');
    expect(sayDay('2026-12-09', '2026-12-01')).toBe('9 December');
    expect(sayDay('2027-01-11', '2026-12-01')).toBe('11 January 2027');
    expect(sayShortDay('2026-12-09', '2026-12-01')).toBe('9 Dec');
    expect(sayShortDay('2027-01-11', '2026-12-01')).toBe('11 Jan 2027');
  });

  it('is said in class with its weekday, for students as for staff with the day before the month', () => {
    expect(sayWeekday('2026-12-04')).toBe('Friday, 4 December');
  });
});

describe('a moment', () => {
  const lateEvening = '2026-12-10T03:05:00Z';

  it('is told by the clock of the school', () => {
    expect(sayMoment(lateEvening, 'America/Chicago', NOW)).toBe('9 December, 21:05');
    expect(sayMoment(lateEvening, 'Europe/London', NOW)).toBe('10 December, 03:05');
    expect(sayTime('2026-12-10T06:00:00Z', 'America/Chicago')).toBe('00:00');
    expect(sayShortDayOf(lateEvening, 'America/Chicago')).toBe('9 Dec');
  });

  it('has the year when it is another by that clock', () => {
    const newYear = '2027-01-01T03:00:00Z';
    expect(sayDayOf(newYear, 'America/Chicago', NOW)).toBe('31 December');
    expect(sayDayOf(newYear, 'Europe/London', NOW)).toBe('1 January 2027');
  });
});
