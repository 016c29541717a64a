import fc from 'fast-check';
import Fraction from 'fraction.js';
import { describe, expect, it } from 'vitest';
import { countedScore, redoInWords } from '@/lib/data/gradebook/counted-score';
import { explainRows } from '@/lib/data/gradebook/explain-rows';
import { exportFileName } from '@/lib/data/gradebook/file-name';
import { localTime } from '@/lib/data/gradebook/local-time';
import { lossBySide } from '@/lib/data/gradebook/loss-by-side';
import { termMean } from '@/lib/data/gradebook/term-mean';
import { deskDeviceId } from '@/lib/data/sittings/desk-device';
import { type Attempt, scoreAttempt } from '@/lib/scoring';
import { uuid } from '@/lib/sync/protocol';
import { defaultRubric, defaultTask, ticksOf } from '@/tests/support/rubrics';

describe('termMean', () => {
  it('keeps the promise of its example', () => {
    expect(
      termMean([
        { score: 8600, total: 10_000 },
        { score: 9500, total: 10_000 },
      ]),
    ).toBe(905);
  });

  it('counts a zero, and every practical the same whatever it is out of', () => {
    expect(
      termMean([
        { score: 0, total: 10_000 },
        { score: 10_000, total: 10_000 },
      ]),
    ).toBe(500);
    expect(
      termMean([
        { score: 2000, total: 2000 },
        { score: 0, total: 10_000 },
      ]),
    ).toBe(500);
    expect(termMean([])).toBeNull();
  });

  it('is rounded once, half up, as exact fractions come out', () => {
    const score = fc
      .tuple(fc.integer({ min: 1, max: 20_000 }), fc.nat())
      .map(([total, at]) => ({ total, score: at % (total + 1) }));
    fc.assert(
      fc.property(fc.array(score, { minLength: 1, maxLength: 8 }), (scores) => {
        const sum = scores.reduce(
          (all, each) => all.add(new Fraction(each.score, each.total)),
          new Fraction(0),
        );
        const tenths = sum.div(scores.length).mul(1000).add(0.5).floor();
        expect(termMean(scores)).toBe(tenths.valueOf());
      }),
    );
  });
});

describe('countedScore', () => {
  const higher = { kind: 'higher', capPercent: 90 } as const;

  it.each([
    [[7000, 9800], 9000],
    [[9500, 9800], 9500],
    [[null, 9800], 9800],
    [[7000, null], 7000],
    [[null, null], null],
  ])('of the attempts %j, %j counts', (scores, counted) => {
    const attempts = scores.map((score) => ({ score, total: 10_000 }));
    expect(countedScore(higher, attempts)?.score ?? null).toBe(counted);
  });

  it('takes the last of attempts that come to different totals', () => {
    expect(
      countedScore(higher, [
        { score: 6000, total: 6300 },
        { score: 5000, total: 5400 },
      ]),
    ).toEqual({ score: 5000, total: 5400 });
  });

  it('says its rule in words', () => {
    expect(redoInWords(higher)).toBe('the higher counts; a redo is worth at most 90%');
    expect(redoInWords({ kind: 'average', roundTo: 100 })).toBe('the mean of the attempts counts');
  });
});

describe('localTime', () => {
  it.each([
    ['2026-03-24T15:42:00Z', 'America/Chicago', '2026-03-24T10:42:00-05:00'],
    ['2026-01-20T15:42:09Z', 'America/Chicago', '2026-01-20T09:42:09-06:00'],
    ['2026-01-20T00:05:00Z', 'Asia/Kolkata', '2026-01-20T05:35:00+05:30'],
    ['2026-01-20T00:00:00Z', 'UTC', '2026-01-20T00:00:00+00:00'],
    ['2026-06-20T23:30:00Z', 'Europe/London', '2026-06-21T00:30:00+01:00'],
  ])('writes %s in %s as %s, which is the same moment', (moment, zone, text) => {
    expect(localTime(new Date(moment), zone)).toBe(text);
    expect(new Date(text).getTime()).toBe(new Date(moment).getTime());
  });
});

describe('exportFileName', () => {
  it.each([
    [{ period: '3', subject: 'Desk caddy', kind: 'grades' }, 'period-3-desk-caddy-grades.csv'],
    [{ period: '2/4', subject: 'Möbel & “Regal”', kind: 'sizes' }, 'period-2-4-mobel-regal-sizes.csv'],
    [{ period: '..', subject: '../../etc', kind: 'grades' }, 'period-etc-grades.csv'],
    [{ period: 'α', subject: '工作', kind: 'grades' }, 'period-grades.csv'],
  ] as const)('names %j %s', (about, name) => {
    expect(exportFileName(about)).toBe(name);
  });
});

describe('deskDeviceId', () => {
  it('is the same UUID every time for one person, and another for everybody else', () => {
    const id = deskDeviceId('school', 'person');
    expect(deskDeviceId('school', 'person')).toBe(id);
    expect(uuid.safeParse(id).success).toBe(true);
    expect(deskDeviceId('school', 'another')).not.toBe(id);
    expect(deskDeviceId('another', 'person')).not.toBe(id);
  });
});

describe('explainRows', () => {
  const rubric = defaultRubric();
  const attempt: Attempt = {
    bonus: 0,
    daysLate: 0,
    work: { labelled: 0 },
    pieces: rubric.lines.flatMap((line) =>
      Array.from({ length: line.quantity }, (_, index) => ({
        lineId: line.id,
        ordinal: index + 1,
        state: 'present' as const,
        sizes: {
          thickness: { kind: 'value' as const, ticks: line.target.thickness },
          width: { kind: 'value' as const, ticks: line.target.width },
          length: {
            kind: 'value' as const,
            ticks: line.target.length - (index === 0 ? ticksOf('1/16') : 0),
          },
        },
        checks: {},
      })),
    ),
  };
  const sheet = scoreAttempt(rubric, attempt);
  const explained = explainRows(defaultTask(), rubric, sheet, 0);

  it('gives each lost point its row: piece, target, reading, deviation, points and share', () => {
    expect(explained.rows).toHaveLength(4);
    expect(explained.rows[0]).toMatchObject({
      kind: 'size',
      piece: 'base',
      what: 'length',
      target: ticksOf('7'),
      reading: ticksOf('6 15/16'),
      deviation: -ticksOf('1/16'),
      points: 100,
    });
    expect(explained.rows[1]?.piece).toBe('end 1');
  });

  it('adds up on both scales', () => {
    const sum = (key: 'points' | 'ofTotal') => explained.rows.reduce((all, row) => all + row[key], 0);
    expect(sum('points')).toBe(explained.lost.points);
    expect(sum('ofTotal')).toBe(explained.lost.ofTotal);
    expect(explained.lost.ofTotal + explained.kept.ofTotal).toBe(explained.total);
    expect(explained.kept.ofTotal + explained.rest).toBe(sheet.score);
  });

  it('counts the sizes and names the checks that cost nothing', () => {
    expect(explained.free).toEqual({ sizes: 23, within: ticksOf('1/32') });
    expect(explained.goodChecks).toEqual(['square', 'surface', 'name and period on pieces']);
    expect(explained.unread).toBe(0);
  });

  it('tells what was lost on which side', () => {
    expect(lossBySide(sheet)).toEqual({ under: 400, over: 0, dearestUnder: 100, dearestOver: 0 });
    expect(lossBySide(null)).toEqual({ under: 0, over: 0, dearestUnder: 0, dearestOver: 0 });
  });
});
