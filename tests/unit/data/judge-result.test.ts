import { describe, expect, it } from 'vitest';
import { PriceBook } from '@/lib/data/pricing/pricing';
import { judgeResult, type RecordedAttempt } from '@/lib/data/sittings/judge-result';
import { sameJson } from '@/lib/data/sittings/same-json';
import { type Attempt, scoreAttempt } from '@/lib/scoring';
import { defaultForm, defaultRubric } from '@/tests/support/rubrics';

const rubric = defaultRubric();
const policy = defaultForm().policies.prediction;
const pricing = new PriceBook([{ versionId: 'v1', number: 1, rubric, policy }]).pricing('v1', []);

const complete: Attempt = {
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
        length: { kind: 'value' as const, ticks: line.target.length },
      },
      checks: {},
    })),
  ),
};

const AT = new Date('2026-12-01T15:00:00Z');

const own = (more: { locked?: boolean; late?: boolean } = {}): RecordedAttempt['own'] => ({
  attempt: complete,
  sheet: scoreAttempt(rubric, complete),
  locked: true,
  late: false,
  ...more,
});

const judge = (attempt: Partial<RecordedAttempt>, countLate = false) =>
  judgeResult(
    pricing,
    { standing: 'expected', recorded: complete, conflicts: 0, measuredAt: AT, own: null, ...attempt },
    countLate,
  );

describe('judgeResult', () => {
  it('scores what is read to the end', () => {
    expect(judge({})).toMatchObject({
      status: 'scored',
      open: null,
      scorePoints: 10_000,
      totalPoints: 10_000,
      measuredAt: AT,
    });
  });

  it.each([
    ['nothing recorded', { recorded: null }, 'unread'],
    ['an emptied record', { recorded: { ...complete, pieces: [], work: {} } }, 'unread'],
    ['one piece short', { recorded: { ...complete, pieces: complete.pieces.slice(1) } }, 'unread sizes'],
    [
      'a piece held',
      {
        recorded: {
          ...complete,
          pieces: complete.pieces.map((piece, at) =>
            at === 0 ? { ...piece, state: 'held' as const } : piece,
          ),
        },
      },
      'unread sizes',
    ],
    ['two readings of one size', { conflicts: 1 }, 'conflict'],
  ] as const)('holds up with %s, and gives it no number', (_, attempt, open) => {
    expect(judge(attempt as Partial<RecordedAttempt>)).toMatchObject({
      status: 'not read',
      open,
      scorePoints: null,
      sheet: null,
    });
  });

  it.each([
    ['absent', null],
    ['excused', null],
    ['zero', 0],
  ] as const)('lets a standing stand whatever was read: %s gives %j', (standing, scorePoints) => {
    expect(judge({ standing })).toMatchObject({ status: standing, scorePoints, open: null, bonusPoints: 0 });
    expect(judge({ standing, recorded: null })).toMatchObject({
      status: standing,
      scorePoints,
      totalPoints: 10_000,
    });
  });

  it('still holds up for a conflict under a standing', () => {
    expect(judge({ standing: 'absent', conflicts: 1 }).open).toBe('conflict');
  });

  it.each([
    ['locked in time', {}, false, 200],
    ['locked late and counted', { late: true }, true, 200],
    ['locked late and left out', { late: true }, false, 0],
    ['not locked', { locked: false }, true, 0],
  ])('gives the bonus of a prediction %s', (_, prediction, countLate, bonus) => {
    const result = judge({ own: own(prediction) }, countLate);
    expect(result.bonusPoints).toBe(bonus);
    expect(result.scorePoints).toBe(10_000 + bonus);
    expect(result.judgement === null).toBe(bonus === 0);
    expect(result.ownSheet).not.toBeNull();
  });

  it('keeps what was predicted as a fact, and nothing where nothing was locked', () => {
    expect(judge({ own: own({ late: true }) }).predictedPoints).toBe(
      scoreAttempt(rubric, complete).provisional,
    );
    expect(judge({ own: own({ locked: false }) }).predictedPoints).toBeNull();
  });

  it('does not change what it was given', () => {
    const before = JSON.stringify(complete);
    judge({ own: own() }, true);
    expect(JSON.stringify(complete)).toBe(before);
  });
});

describe('sameJson', () => {
  it('is equal for equal values in any order of keys, and keeps the order of lists', () => {
    expect(sameJson({ a: 1, b: { c: 2, d: [1, 2] } })).toBe(sameJson({ b: { d: [1, 2], c: 2 }, a: 1 }));
    expect(sameJson([1, 2])).not.toBe(sameJson([2, 1]));
    expect(sameJson({ at: AT })).toBe(sameJson({ at: AT.toISOString() }));
  });
});
