import { describe, expect, it } from 'vitest';
import { judgePrediction, type Line } from '@/lib/scoring';
import {
  absent,
  at,
  EXCUSED,
  GAUGED,
  judge,
  length,
  policy,
  shelf,
  shelves,
  thickness,
  width,
  without,
} from '../../support/prediction-examples';
import { makeAttempt, makeCheck, makePiece, makeRubric } from '../../support/scoring-examples';

describe('the shares are reached exactly', () => {
  const ten = shelves(4);
  const read = (count: number) =>
    Array.from({ length: 4 }, (_, index) => {
      const piece = shelf(index + 1);
      return index < 3 ? piece : without({ ...piece, sizes: { ...piece.sizes, width: EXCUSED } }, 'length');
    }).map((piece, index) =>
      index < count ? { ...piece, sizes: { ...piece.sizes, length: at(100) } } : piece,
    );

  it('nine of ten are nine tenths, eight are not', () => {
    expect(judge(read(1), read(0), ten, { closeWithin: 0 })).toMatchObject({
      of: 10,
      agree: 9,
      because: 'full',
    });
    expect(judge(read(2), read(0), ten, { closeWithin: 0 })).toMatchObject({
      of: 10,
      agree: 8,
      because: 'too-few-agree',
    });
  });

  it('a third of three is reached by one, though no decimal says a third', () => {
    const third = { num: 1, den: 3 };
    const teacher = [makePiece('shelf', 1, { thickness, width, length })];
    const one = [makePiece('shelf', 1, { length })];
    expect(judge(one, teacher, shelves(1), { valueShare: third }).because).toBe('full');
    expect(
      judge([makePiece('shelf', 1)], teacher, shelves(1), { valueShare: third, closeWithin: 0 }).because,
    ).toBe('close');
    expect(judge(one, teacher, shelves(1), { valueShare: { num: 333_334, den: 1_000_000 } }).because).toBe(
      'close',
    );
  });

  it('two of three caught are two thirds, one is not', () => {
    const teacher = [1, 2, 3].map((ordinal) => shelf(ordinal, { length: 4 * ordinal }));
    const seen = (count: number) =>
      teacher.map((piece, index) =>
        index < count ? piece : { ...piece, sizes: { ...piece.sizes, length: GAUGED } },
      );
    const any = { agreeShare: { num: 1, den: 9 } };
    expect(judge(seen(2), teacher, shelves(3), any)).toMatchObject({
      offBand: 3,
      caught: 2,
      because: 'full',
    });
    expect(judge(seen(1), teacher, shelves(3), { ...any, closeWithin: 0 })).toMatchObject({
      caught: 1,
      because: 'too-few-caught',
    });
  });

  it('what fails first gives the reason: agreement, then losses caught, then values', () => {
    const none = { closeWithin: 0 };
    const teacher = [makePiece('shelf', 1, { thickness, width, length: at(9) })];
    const gauged = [makePiece('shelf', 1)];
    expect(judge(gauged, teacher, shelves(1), none).because).toBe('too-few-agree');
    expect(judge(gauged, teacher, shelves(1), { ...none, agreeShare: { num: 2, den: 3 } }).because).toBe(
      'too-few-caught',
    );
  });
});

describe('a close total', () => {
  // Loses 3 of 9 by the teacher; the student's nearest guess differs by what is asked.
  const line: Partial<Line> = { worth: 900 };
  const teacher = [shelf(1, { length: 9 })];

  it('wins the smaller bonus at exactly the distance allowed, and nothing a hundredth past it', () => {
    const gauged = [makePiece('shelf', 1, { thickness, width })];
    expect(judge(gauged, teacher, shelves(1, line))).toMatchObject({
      gap: 300,
      because: 'close',
      bonus: 100,
    });
    expect(judge(gauged, teacher, shelves(1, line), { closeWithin: 299 })).toMatchObject({
      gap: 300,
      bonus: 0,
    });
  });

  it('does not count for a student who left a size unread, a piece unlisted or set aside', () => {
    const good = [shelf(1), shelf(2, { length: 3 })];
    const rubric = shelves(2);
    expect(judge([shelf(1), without(shelf(2), 'length')], good, rubric).because).toBe('too-few-agree');
    expect(judge([shelf(1)], good, rubric).because).toBe('too-few-agree');
    expect(judge([shelf(1), absent('held', 2)], good, rubric, { closeWithin: 10_000 }).because).toBe(
      'too-few-agree',
    );
    expect(judge([shelf(1), shelf(2, { length: -3 })], good, rubric)).toMatchObject({
      agree: 5,
      gap: 0,
      because: 'close',
    });
  });

  it('counts though a check was not recorded', () => {
    const rubric = shelves(1, { checks: [makeCheck('square', [0, 100], null)] });
    expect(judge([shelf(1, { length: -9 })], teacher, rubric).because).toBe('close');
  });

  it('takes both scores without bonus or lateness', () => {
    const rubric = makeRubric({ late: { perDay: 10, max: 50 }, ceiling: 200 });
    const student = makeAttempt([shelf(1, { length: 9 })], { bonus: 500, daysLate: 3 });
    expect(judgePrediction(rubric, student, makeAttempt(teacher), policy)).toMatchObject({
      gap: 0,
      because: 'full',
    });
  });

  it('is none where one side has no score', () => {
    const judged = judge([absent('excused', 1)], teacher, shelves(1), { closeWithin: 100_000 });
    expect(judged).toMatchObject({ gap: null, because: 'too-few-agree', bonus: 0 });
  });
});
