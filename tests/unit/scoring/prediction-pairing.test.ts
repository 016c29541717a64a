import { describe, expect, it } from 'vitest';
import {
  absent,
  at,
  EXCUSED,
  judge,
  length,
  SPOILED,
  shelf,
  shelves,
  thickness,
} from '../../support/prediction-examples';
import { makeLine, makePiece, makeRubric, sixtyFourths } from '../../support/scoring-examples';

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
