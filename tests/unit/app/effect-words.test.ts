import { describe, expect, it } from 'vitest';
import { signedTenths } from '@/app/(head)/department/shared/_components/words';
import {
  changeScale,
  sayScale,
  sayVerdict,
} from '@/app/(head)/department/shared/[versionId]/_components/effect-words';
import type { SectionEffect, SharedVersionView } from '@/lib/data/department/read-shared-version';

const section = (period: string, change: number | null): SectionEffect => ({
  sittingId: period,
  sectionName: 'Woods 2',
  period,
  termName: 'Fall 2026',
  ownerName: 'Rut Lindqvist',
  versionNumber: 1,
  students: change === null ? 6 : 20,
  effect:
    change === null
      ? null
      : { meanNow: 8000, meanThen: 8000 + change, change, changes: [change, 100 - change] },
});

const say = (sections: SectionEffect[], kind: 'points' | 'share' = 'points') => {
  const scale = kind === 'points' ? { kind, total: 10_000 } : { kind };
  const view: Pick<SharedVersionView, 'sections' | 'scale'> = { sections, scale };
  return sayVerdict(view);
};

describe('the effect in words', () => {
  it('says of each section whether it would stand higher, lower or stay', () => {
    expect(say([section('3', 0), section('5', 530), section('7', -120), section('8', null)])).toBe(
      'Period 3 would stay, period 5 would stand 5.3 higher and period 7 would stand 1.2 lower.',
    );
    expect(say([section('5', -40)], 'share')).toBe('Period 5 would stand 0.4 percent lower.');
  });

  it('says when nobody’s score would change', () => {
    const still = section('3', 0);
    if (still.effect) still.effect.changes = [0, 0];
    expect(say([still, section('7', null)])).toBe('No score would change.');
  });

  it('says so when no mean moves, and when too few can be told', () => {
    expect(say([section('3', 0), section('5', 0)])).toBe('Every section’s mean would stay as it is.');
    expect(say([section('3', 0)])).toBe('The mean would stay as it is.');
    expect(say([section('3', null)])).toBe('Every section has too few students to show what it would do.');
  });

  it('names the scale, signs changes, and draws all sections on one', () => {
    expect(sayScale({ kind: 'points', total: 10_000 })).toBe('Scores are points of 100.');
    expect(sayScale({ kind: 'share' })).toContain('in percent');
    expect([signedTenths(530), signedTenths(-40), signedTenths(0)]).toEqual(['+5.3', '−0.4', '0.0']);
    expect(changeScale([[-1234, 0], [250]])).toEqual({ from: -17, to: 12 });
    expect(changeScale([])).toEqual({ from: -12, to: 12 });
  });
});
