import { describe, expect, it } from 'vitest';
import {
  checkRows,
  typedChecks,
} from '@/app/(teacher)/periods/[sectionId]/modified/new/_components/check-rows';
import { effectsOf } from '@/app/(teacher)/periods/[sectionId]/modified/new/_components/effect';
import type { DeskSitting } from '@/lib/data/accommodations/read-accommodation-desk';
import type { Modification } from '@/lib/scoring/modification';
import {
  makeAttempt,
  makeCheck,
  makeLine,
  makePiece,
  makeRubric,
  sixtyFourths,
} from '../../support/scoring-examples';

const NONE: Modification = { format: 1, widen: { num: 1, den: 1 }, excused: [], checks: [] };
const SHORT = makeAttempt([makePiece('shelf', 1, { length: sixtyFourths(256 - 4) })]);

function sitting(change: Partial<DeskSitting> = {}): DeskSitting {
  const lines = [makeLine({ checks: [makeCheck('square', [0, 100])] })];
  return {
    ...{ sittingId: 'first', title: 'Shelf', versionNumber: 1, attempts: [] },
    rubric: makeRubric({ lines, workChecks: [makeCheck('labelled', [0, 50, 100])] }),
    ...change,
  };
}

describe('the checks that can be modified', () => {
  it('are each named once, with the most levels that one of the sittings has', () => {
    const other = makeRubric({
      lines: [makeLine({ checks: [makeCheck('Square', [0, 50, 200]), makeCheck('grain', [0])] })],
    });
    const rows = checkRows([sitting(), sitting({ sittingId: 'second', rubric: other })], []);
    expect(rows.map(({ label, of, levels }) => [label, of, levels.length])).toEqual([
      ['square', 'piece', 3],
      ['labelled', 'work', 3],
    ]);
  });

  it('keep those that a modification names and no sitting has', () => {
    const rows = checkRows([], [{ label: 'shine', as: 'priced', lose: ['1', '2'] }]);
    expect(rows.map(({ label, levels }) => [label, levels.length])).toEqual([['shine', 3]]);
  });

  it('stand as the rubric has them until something is typed', () => {
    const rows = checkRows([sitting()], []);
    expect(typedChecks(rows, [{ label: 'SQUARE', as: 'priced', lose: ['0.5'] }])).toEqual([
      { label: 'square', as: 'priced', lose: ['0.5'] },
      { label: 'labelled', as: 'rubric', lose: ['0.5', '1'] },
    ]);
  });
});

describe('what a modification gives', () => {
  const recorded = sitting({ attempts: [{ attemptNumber: 1, recorded: SHORT }] });

  it('is the score as everybody’s and modified, of the same total', () => {
    const [effect] = effectsOf([recorded], { ...NONE, widen: { num: 2, den: 1 } }, []);
    expect(effect).toMatchObject({ title: 'Shelf', before: 800, after: 900, total: 900, ownStands: false });
  });

  it('tells the sittings that keep a modified rubric of their own', () => {
    expect(effectsOf([recorded], NONE, ['first'])[0]).toMatchObject({
      before: 800,
      after: 800,
      ownStands: true,
    });
  });
});
