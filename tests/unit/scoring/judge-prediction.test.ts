import { describe, expect, it } from 'vitest';
import type { Length } from '@/lib/length';
import { judgePrediction, type Reading } from '@/lib/scoring';
import {
  absent,
  at,
  EXCUSED,
  GAUGED,
  judge,
  judgeLength,
  length,
  policy,
  SPOILED,
  shelf,
  shelves,
  thickness,
  width,
  without,
} from '../../support/prediction-examples';
import {
  makeAttempt,
  makeCheck,
  makeLine,
  makePiece,
  makeRubric,
  sixtyFourths,
  value,
} from '../../support/scoring-examples';

describe('judging a prediction', () => {
  it('gives the example of its description', () => {
    const same = makeAttempt([shelf(1, { length: 5 })]);
    expect(judgePrediction(shelves(1), same, same, policy).because).toBe('full');
  });

  it('changes neither attempt', () => {
    const student = makeAttempt([shelf(1), shelf(2, { length: 9 })], { bonus: 100, daysLate: 2 });
    const teacher = makeAttempt([shelf(2), shelf(1, { length: 9 })], { bonus: 300, daysLate: 1 });
    const before = structuredClone({ student, teacher });
    judgePrediction(shelves(2), student, teacher, policy);
    expect({ student, teacher }).toEqual(before);
  });
});

describe('three students and the same poor set of nine shelves', () => {
  const rubric = makeRubric({ lines: [makeLine({ quantity: 9 })], outOf: 10_000, roundTo: 100 });
  // Every third shelf is an eighth short, the width of a kerf.
  const offOf = (ordinal: number) => ({ length: ordinal % 3 === 0 ? -8 : 0, width: ordinal % 2 });
  const ordinals = Array.from({ length: 9 }, (_, index) => index + 1);
  const bench = ordinals.map((ordinal) => shelf(ordinal, offOf(ordinal)));

  it('one honest and right wins the full bonus on poor parts', () => {
    const honest = ordinals.map((ordinal) => shelf(ordinal, { ...offOf(ordinal), thickness: 1 }));
    expect(judge(honest, bench, rubric)).toEqual({
      of: 27,
      agree: 27,
      offBand: 3,
      caught: 3,
      gap: 0,
      bonus: 200,
      because: 'full',
    });
  });

  it('one who copies the targets caught nothing and does not win it, though nine in ten agree', () => {
    const poorest = bench.map((_, index) =>
      index < 2 ? shelf(index + 1, { length: -8 }) : shelf(index + 1),
    );
    const copied = judge(
      ordinals.map((ordinal) => shelf(ordinal)),
      poorest,
      rubric,
      { closeWithin: 0 },
    );
    expect(copied).toMatchObject({
      of: 27,
      agree: 25,
      offBand: 2,
      caught: 0,
      because: 'too-few-caught',
      bonus: 0,
    });
  });

  it('one who copies the targets may still come close in total where the set is nearly good', () => {
    const nearly = ordinals.map((ordinal) => shelf(ordinal, ordinal === 1 ? { length: 3 } : {}));
    const copied = judge(
      ordinals.map((ordinal) => shelf(ordinal)),
      nearly,
      rubric,
    );
    expect(copied).toMatchObject({ offBand: 1, caught: 0, gap: 100, because: 'close', bonus: 100 });
  });

  it('one who measures a kerf short throughout agrees with too little', () => {
    const kerfShort = ordinals.map((ordinal) => {
      const { length: off, width: wide } = offOf(ordinal);
      return shelf(ordinal, { length: off - 8, width: wide });
    });
    const judged = judge(kerfShort, bench, rubric);
    expect(judged).toMatchObject({ of: 27, because: 'too-few-agree', bonus: 0 });
    // Paired by nearness, the six good ones as read stand for the three short ones and for three of the good.
    expect(judged.agree).toBeLessThan(27 * 0.9);
  });

  it('one who gauges everything by eye on a good set reads too little', () => {
    const good = ordinals.map((ordinal) => shelf(ordinal));
    const gauged = ordinals.map((ordinal) => makePiece('shelf', ordinal));
    expect(judge(gauged, good, rubric, { closeWithin: 0 }).because).toBe('close');
    const tall = makeRubric({
      ...rubric,
      lines: [makeLine({ quantity: 9, checks: [makeCheck('square', [0, 400])] })],
    });
    const untidy = gauged.map((piece) => ({ ...piece, checks: { square: 1 } }));
    expect(judge(untidy, good, tall)).toMatchObject({ agree: 27, because: 'too-few-values', bonus: 0 });
  });
});

describe('what counts as an item', () => {
  it('is every size that the teacher recorded as value, gauged or spoiled', () => {
    const teacher = makePiece('shelf', 1, { thickness, width: GAUGED, length: SPOILED });
    expect(judge([shelf(1)], [teacher])).toMatchObject({ of: 3, agree: 2, offBand: 1, caught: 0 });
  });

  it('is no size that the teacher excused or did not read', () => {
    const teacher = without(makePiece('shelf', 1, { thickness, width: EXCUSED }), 'length');
    expect(judge([shelf(1)], [teacher])).toMatchObject({ of: 1, agree: 1 });
  });

  it('is every missing piece, once', () => {
    const both = judge([absent('missing', 1), shelf(2)], [absent('missing', 2), shelf(1)]);
    expect(both).toMatchObject({ of: 4, agree: 4, offBand: 1, caught: 1, because: 'full' });
  });

  it.each(['held', 'excused'] as const)('is nothing of a piece that the teacher has as %s', (state) => {
    expect(judge([shelf(1), shelf(2)], [shelf(1), absent(state, 2)])).toMatchObject({ of: 3 });
  });

  it('is nothing of a piece that the teacher did not list', () => {
    expect(judge([shelf(1), shelf(2)], [shelf(1)])).toMatchObject({ of: 3, agree: 3 });
  });

  it('is not what a missing piece still carries', () => {
    const missing = { ...shelf(1, { length: 9 }), state: 'missing' as const };
    expect(judge([missing], [missing])).toMatchObject({ of: 1, agree: 1, offBand: 1, caught: 1 });
  });

  it('none at all leaves nothing to judge and no bonus', () => {
    const unread = without(makePiece('shelf', 1), 'thickness', 'width', 'length');
    expect(judge([shelf(1)], [unread])).toEqual({
      of: 0,
      agree: 0,
      offBand: 0,
      caught: 0,
      gap: 0,
      bonus: 0,
      because: 'nothing-to-judge',
    });
  });
});

describe('a size agrees', () => {
  const within = policy.agreeWithin;
  const off = (ticks: Length): Reading => value(length + ticks);

  it.each<[string, Reading | undefined, Reading, boolean]>([
    ['two values that differ by exactly the distance allowed', off(within), at(0), true],
    ['two values that differ by a tick more', off(within + 1), at(0), false],
    ['the same below the target', off(-within), at(0), true],
    ['a tick more below the target', off(-within - 1), at(0), false],
    ['two values far off the target and near each other', at(30), at(31), true],
    ['gauged by the teacher, a value in the free band', at(2), GAUGED, true],
    ['gauged by the teacher, a value past the free band', off(sixtyFourths(2) + 1), GAUGED, false],
    ['gauged by both', GAUGED, GAUGED, true],
    ['gauged by the teacher, spoiled for the student', SPOILED, GAUGED, false],
    ['gauged by the teacher, excused by the student', EXCUSED, GAUGED, false],
    ['gauged by the teacher, not read by the student', undefined, GAUGED, false],
    ['gauged by the student, a value in the free band', GAUGED, at(-2), true],
    ['gauged by the student, a value past the free band', GAUGED, off(-sixtyFourths(2) - 1), false],
    ['gauged by the student, spoiled for the teacher', GAUGED, SPOILED, false],
    ['spoiled for both', SPOILED, SPOILED, true],
    ['spoiled for the teacher, a value of the student', at(20), SPOILED, false],
    ['spoiled for the teacher, not read by the student', undefined, SPOILED, false],
    ['a value of the teacher, spoiled for the student', SPOILED, at(0), false],
    ['a value of the teacher, excused by the student', EXCUSED, at(0), false],
    ['a value of the teacher, not read by the student', undefined, at(0), false],
  ])('or not: %s', (_, own, theirs, agreed) => {
    expect(judgeLength(own, theirs).agree).toBe(agreed ? 3 : 2);
  });

  it('as scored: after rounding to the step of reading', () => {
    const rubric = makeRubric({ readTo: sixtyFourths(4) });
    // A tick apart, yet rounded to 0 and to 4/64.
    const [own, theirs] = [off(sixtyFourths(2)), off(sixtyFourths(2) + 1)];
    expect(judgeLength(own, theirs, rubric).agree).toBe(2);
    expect(judgeLength(own, theirs).agree).toBe(3);
  });

  it('as scored: after the proven offset of each side', () => {
    const teacher = makeAttempt([makePiece('shelf', 1, { length: at(8) })], {
      adjust: { shelf: { length: -sixtyFourths(8) } },
    });
    const student = makeAttempt([makePiece('shelf', 1, { length: at(0) })]);
    expect(judgePrediction(shelves(1), student, teacher, policy)).toMatchObject({
      agree: 3,
      offBand: 0,
      gap: 0,
    });
  });

  it('as scored: whichever way round thickness and width were read', () => {
    const turned = makePiece('shelf', 1, { thickness: width, width: thickness, length });
    expect(judge([turned], [shelf(1)])).toMatchObject({ agree: 3, because: 'full' });
    expect(judge([turned], [shelf(1)], shelves(1, { swap: false }))).toMatchObject({ agree: 1 });
  });
});

describe('missing pieces', () => {
  it('agree as far as both sides call as many of the line missing, whichever they are', () => {
    const student = [absent('missing', 1), absent('missing', 2), shelf(3), shelf(4)];
    const teacher = [shelf(1), shelf(2), shelf(3), absent('missing', 4)];
    // The third piece on the bench has no partner and disagrees throughout.
    expect(judge(student, teacher)).toMatchObject({ of: 10, agree: 7, offBand: 1, caught: 1 });
    expect(judge(teacher, student)).toMatchObject({ of: 8, agree: 7, offBand: 2, caught: 1 });
  });

  it('of one line do not stand for those of another', () => {
    const rubric = makeRubric({ lines: [makeLine({}), makeLine({ id: 'rail' })] });
    const judged = judge(
      [absent('missing', 1), shelf(1, {}, 'rail')],
      [shelf(1), { ...absent('missing', 1), lineId: 'rail' }],
      rubric,
    );
    expect(judged).toMatchObject({ of: 4, agree: 0, offBand: 1, caught: 0 });
  });

  it('that cost nothing are not among those to be caught', () => {
    expect(judge([shelf(1)], [absent('missing', 1)], shelves(1, { missing: 0 }))).toMatchObject({
      of: 1,
      agree: 0,
      offBand: 0,
    });
  });
});

describe('a loss is caught', () => {
  it.each<[string, Reading | undefined, Reading, number, number]>([
    ['by a value that loses as well, however much', at(40), at(3), 1, 1],
    ['by a value on the other side that loses', at(-3), at(3), 1, 1],
    ['not by a value in the free band', at(1), at(3), 1, 0],
    ['not by gauging', GAUGED, at(3), 1, 0],
    ['by calling spoiled what the teacher read', SPOILED, at(3), 1, 1],
    ['not by leaving it unread', undefined, at(3), 1, 0],
    ['when spoiled, by spoiled alone', SPOILED, SPOILED, 1, 1],
    ['when spoiled, not by a value that loses', at(40), SPOILED, 1, 0],
    ['only where the teacher found one', at(40), at(1), 0, 0],
  ])('%s', (_, own, theirs, offBand, caught) => {
    expect(judgeLength(own, theirs)).toMatchObject({ offBand, caught });
  });
});
