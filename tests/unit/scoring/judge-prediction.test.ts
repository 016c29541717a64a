import fc from 'fast-check';
import { describe, expect, it, vi } from 'vitest';
import type { Length } from '@/lib/length';
import {
  type Attempt,
  type Axis,
  judgePrediction,
  type Line,
  type Piece,
  type PredictionPolicy,
  type Reading,
  type Rubric,
  rescore,
} from '@/lib/scoring';
import { judgeByOracle } from '../../support/prediction-oracle';
import { attemptArb, rubricArb } from '../../support/scoring-arbitraries';
import {
  makeAttempt,
  makeCheck,
  makeLine,
  makePiece,
  makeRubric,
  sixtyFourths,
  value,
} from '../../support/scoring-examples';

// Many generated cases: give them time on a busy machine.
vi.setConfig({ testTimeout: 60_000 });

const GAUGED: Reading = { kind: 'gauged' };
const SPOILED: Reading = { kind: 'spoiled' };
const EXCUSED: Reading = { kind: 'excused' };

const policy: PredictionPolicy = {
  agreeWithin: sixtyFourths(2),
  agreeShare: { num: 9, den: 10 },
  caughtShare: { num: 2, den: 3 },
  valueShare: { num: 1, den: 2 },
  full: 200,
  closeWithin: 300,
  close: 100,
};

const { thickness, width, length } = makeLine({}).target;

/** A shelf by how far each size is off, in 64ths. */
function shelf(ordinal: number, off: Partial<Record<Axis, number>> = {}, lineId = 'shelf'): Piece {
  return makePiece(lineId, ordinal, {
    thickness: thickness + sixtyFourths(off.thickness ?? 0),
    width: width + sixtyFourths(off.width ?? 0),
    length: length + sixtyFourths(off.length ?? 0),
  });
}

function without(piece: Piece, ...axes: Axis[]): Piece {
  const sizes = { ...piece.sizes };
  for (const axis of axes) delete sizes[axis];
  return { ...piece, sizes };
}

const absent = (state: Piece['state'], ordinal: number): Piece => ({
  lineId: 'shelf',
  ordinal,
  state,
  sizes: {},
  checks: {},
});

const shelves = (quantity: number, changes: Parameters<typeof makeLine>[0] = {}) =>
  makeRubric({ lines: [makeLine({ quantity, ...changes })] });

function judge(
  student: Piece[],
  teacher: Piece[],
  rubric: Rubric = shelves(Math.max(student.length, teacher.length)),
  changes: Partial<PredictionPolicy> = {},
) {
  return judgePrediction(rubric, makeAttempt(student), makeAttempt(teacher), { ...policy, ...changes });
}

/** One size read by both, the other two gauged by both. */
function judgeLength(own: Reading | undefined, theirs: Reading | undefined, rubric = shelves(1)) {
  const piece = (reading: Reading | undefined) =>
    reading ? makePiece('shelf', 1, { length: reading }) : without(makePiece('shelf', 1), 'length');
  return judge([piece(own)], [piece(theirs)], rubric);
}

const at = (off: number): Reading => value(length + sixtyFourths(off));

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

describe('which piece is compared with which', () => {
  it('is nobody’s knowledge: equal sticks numbered otherwise agree', () => {
    const teacher = [shelf(1, { length: 10 }), shelf(2, { length: -6 }), shelf(3)];
    const student = [shelf(1, { length: -6 }), shelf(2), shelf(3, { length: 10 })];
    expect(judge(student, teacher)).toMatchObject({
      of: 9,
      agree: 9,
      offBand: 2,
      caught: 2,
      because: 'full',
    });
  });

  it('never reaches over lines', () => {
    const rubric = makeRubric({ lines: [makeLine({}), makeLine({ id: 'rail' })] });
    const teacher = [shelf(1, { length: 10 }), shelf(1, {}, 'rail')];
    const student = [shelf(1), shelf(1, { length: 10 }, 'rail')];
    expect(judge(student, teacher, rubric)).toMatchObject({ of: 6, agree: 4 });
  });

  it('is settled by the total, not by the nearest first', () => {
    // 0 with -8 and 3 with 1 make 10, in 64ths; the nearest two first, 0 with 1, would leave 3 with -8: 12.
    const teacher = [shelf(1), shelf(2, { length: 3 })];
    const student = [shelf(1, { length: 1 }), shelf(2, { length: -8 })];
    expect(judge(student, teacher)).toMatchObject({ agree: 5, offBand: 1, caught: 0 });
  });

  it('where distances tie, is the one that agrees most', () => {
    // 0 and 4 against 2 and 6: paired straight 2 + 2, crossed 6 + 2, in 64ths.
    const straight = judge(
      [shelf(1, { length: 2 }), shelf(2, { length: 6 })],
      [shelf(1), shelf(2, { length: 4 })],
    );
    expect(straight.agree).toBe(6);
    // 0 and 2 against 3 and 5: straight 3 + 3 with none agreeing, crossed 5 + 1 with one.
    const crossed = judge(
      [shelf(1, { length: 3 }), shelf(2, { length: 5 })],
      [shelf(1), shelf(2, { length: 2 })],
    );
    expect(crossed.agree).toBe(5);
  });

  it('where distances tie, counts what agrees and not what does not', () => {
    // Both of the teacher's are 10 m and 3/64 off and disagree once; the second agrees twice, the first once.
    const first = makePiece('shelf', 1, { thickness: thickness + sixtyFourths(3), width: EXCUSED, length });
    const second = makePiece('shelf', 2, { width: SPOILED, length: at(3) });
    const own = makePiece('shelf', 1, { length });
    const judged = judge([own], [first, second], shelves(2), { agreeWithin: sixtyFourths(3) });
    expect(judged).toMatchObject({ of: 5, agree: 2 });
  });

  it('where all ties, is the lowest ordinals', () => {
    // The student's piece is 1/128 from either: within the free band of the second, past that of the first.
    const half = sixtyFourths(1) / 2;
    const own = makePiece('shelf', 2, { length: length + sixtyFourths(2) + half });
    const [loses, free] = [shelf(1, { length: 3 }), shelf(2, { length: 2 })];
    expect(judge([own], [loses, free], shelves(2))).toMatchObject({ agree: 3, offBand: 1, caught: 1 });
    const turned = [shelf(1, { length: 2 }), shelf(2, { length: 3 })];
    expect(judge([own], turned, shelves(2))).toMatchObject({ agree: 3, offBand: 1, caught: 0 });
  });

  it('leaves the teacher’s piece without a partner disagreeing throughout', () => {
    const judged = judge([shelf(1, { length: 9 })], [shelf(1), shelf(2, { length: 9 })]);
    expect(judged).toMatchObject({ of: 6, agree: 3, offBand: 1, caught: 1 });
  });

  it('takes pieces that are present on both sides only', () => {
    const judged = judge([absent('held', 1), shelf(2)], [shelf(1), absent('excused', 2)]);
    expect(judged).toMatchObject({ of: 3, agree: 3 });
  });
});

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

describe('generated predictions', () => {
  const share = fc
    .tuple(fc.integer({ min: 1, max: 12 }), fc.integer({ min: 0, max: 6 }))
    .map(([num, more]) => ({ num, den: num + more }));
  const policyArb: fc.Arbitrary<PredictionPolicy> = fc.record({
    agreeWithin: fc.oneof(fc.constantFrom(0, 1, 2, 5), fc.integer({ min: 0, max: sixtyFourths(8) })),
    agreeShare: share,
    caughtShare: share,
    valueShare: share,
    full: fc.constant(200),
    closeWithin: fc.constantFrom(0, 100, 3000, 100_000),
    close: fc.constant(100),
  });
  const caseArb = rubricArb.chain((rubric) =>
    fc.record({
      rubric: fc.constant(rubric),
      student: attemptArb(rubric),
      teacher: attemptArb(rubric),
      policy: policyArb,
    }),
  );
  /** The student's pieces are the teacher's in another order, a few sizes changed: pairings near each other. */
  const jumbledArb = fc
    .tuple(
      fc.array(fc.tuple(fc.integer({ min: -5, max: 5 }), fc.integer({ min: -5, max: 5 })), {
        minLength: 1,
        maxLength: 5,
      }),
      fc.infiniteStream(fc.constantFrom<Reading | 'same' | 'near'>('same', 'same', 'near', GAUGED, SPOILED)),
      fc.infiniteStream(fc.nat()),
    )
    .map(([offs, changes, keys]) => {
      const teacher = offs.map(([a, b], index) => shelf(index + 1, { length: a, thickness: b }));
      const order = teacher
        .map((piece) => ({ piece, key: keys.next().value }))
        .toSorted((a, b) => a.key - b.key);
      const student = order.map(({ piece }, index) => {
        const change = changes.next().value;
        const sizes = { ...piece.sizes };
        if (change === 'near') sizes.width = value(width + sixtyFourths(1));
        else if (change !== 'same') sizes.length = change;
        return { ...piece, ordinal: index + 1, sizes };
      });
      return { teacher, student };
    });

  it('are judged as a trial of every pairing judges them', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, student, teacher, policy: asked }) => {
        expect(judgePrediction(rubric, student, teacher, asked)).toEqual(
          judgeByOracle(rubric, student, teacher, asked),
        );
      }),
      { numRuns: 600 },
    );
  });

  it('of jumbled equal parts are judged as a trial of every pairing judges them', () => {
    fc.assert(
      fc.property(jumbledArb, fc.integer({ min: 0, max: 4 }), ({ teacher, student }, steps) => {
        const rubric = shelves(5);
        const asked = { ...policy, agreeWithin: sixtyFourths(steps) };
        const [own, bench]: Attempt[] = [makeAttempt(student), makeAttempt(teacher)];
        if (!own || !bench) return;
        expect(judgePrediction(rubric, own, bench, asked)).toEqual(judgeByOracle(rubric, own, bench, asked));
      }),
      { numRuns: 400 },
    );
  });

  it('of one’s own readings agree throughout where the teacher read the same', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, teacher, policy: asked }) => {
        const judged = judgePrediction(rubric, teacher, teacher, asked);
        expect(judged.agree).toBe(judged.of);
        expect(judged.caught).toBe(judged.offBand);
        expect(judged.gap ?? 0).toBe(0);
      }),
      { numRuns: 300 },
    );
  });

  it('count no more than there is, and pay only what the policy pays', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, student, teacher, policy: asked }) => {
        const { of, agree, offBand, caught, bonus, because } = judgePrediction(
          rubric,
          student,
          teacher,
          asked,
        );
        expect(agree).toBeLessThanOrEqual(of);
        expect(offBand).toBeLessThanOrEqual(of);
        expect(caught).toBeLessThanOrEqual(offBand);
        expect(bonus).toBe(because === 'full' ? 200 : because === 'close' ? 100 : 0);
      }),
      { numRuns: 200 },
    );
  });

  it('that copy the targets never win the full bonus where the teacher found a loss', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, teacher, policy: asked }) => {
        const pieces = rubric.lines.flatMap((line) =>
          Array.from({ length: line.quantity }, (_, index) => makePiece(line.id, index + 1, line.target)),
        );
        const judged = judgePrediction(rubric, makeAttempt(pieces), teacher, asked);
        fc.pre(judged.offBand > 0);
        expect(judged.because).not.toBe('full');
      }),
      { numRuns: 200 },
    );
  });

  it('have the gap that rescoring both gives', () => {
    fc.assert(
      fc.property(caseArb, ({ rubric, student, teacher, policy: asked }) => {
        const bare = [student, teacher].map((attempt) => ({ ...attempt, bonus: 0, daysLate: 0 }));
        const [own, bench] = rescore(rubric, bare).map(({ provisional }) => provisional);
        const gap = typeof own === 'number' && typeof bench === 'number' ? Math.abs(own - bench) : null;
        expect(judgePrediction(rubric, student, teacher, asked).gap).toBe(gap);
      }),
      { numRuns: 200 },
    );
  });
});
