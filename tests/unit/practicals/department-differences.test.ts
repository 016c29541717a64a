import { describe, expect, it } from 'vitest';
import { departmentDifferences } from '@/lib/practicals/department-differences';
import { comparedStarter } from '@/tests/support/compared';

const approved = comparedStarter('approved');

describe('differences from the department’s rubric', () => {
  it('are none for the same prices, as in the example of its docblock', () => {
    expect(departmentDifferences(approved, { ...approved, label: 'Okonjo' })).toEqual({
      same: true,
      sentences: [],
    });
  });

  it('say who takes how much more than the department, and for what', () => {
    const own = comparedStarter('Okonjo', (draft) => {
      draft.all.sizes.length.mirrored = false;
      draft.all.sizes.length.under.beyond = '5';
    });
    const { same, sentences } = departmentDifferences(approved, own);
    expect(same).toBe(false);
    expect(sentences).toHaveLength(1);
    expect(sentences[0]?.[0]).toBe('Okonjo takes 2 points more than the department for ');
  });

  it('of other sizes of the same pieces say so, and compare the prices all the same', () => {
    const longer = comparedStarter('Okonjo', (draft) => {
      for (const line of draft.lines) line.width = '2 1/4';
    });
    expect(departmentDifferences(approved, longer)).toEqual({
      same: false,
      sentences: [['It asks for other sizes of the same pieces.']],
    });
    const dearer = comparedStarter('Okonjo', (draft) => {
      for (const line of draft.lines) line.width = '2 1/4';
      draft.redo.capPercent = '100';
    });
    const { sentences } = departmentDifferences(approved, dearer);
    expect(sentences).toHaveLength(2);
    expect(sentences[1]).toEqual(['A redo counts up to', ': ', '100%', ', the department ', '90%', '.']);
  });

  it('of other pieces set no prices against each other', () => {
    const other = comparedStarter('Okonjo', (draft) => {
      draft.lines.pop();
    });
    const { same, sentences } = departmentDifferences(approved, other);
    expect(same).toBe(false);
    expect(sentences).toEqual([
      ['It asks for other pieces, so its prices are not set against the department’s.'],
    ]);
  });
});
