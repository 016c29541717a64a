'use client';

import { useState } from 'react';
import type { DraftSizeRule, PracticalDraft } from '@/lib/practicals/draft';
import { AXES, type Axis } from '@/lib/scoring';
import { lineOf, useEditor } from './editor-context';

/** The price of one size of a line, or of all lines, with what changes it. */
export interface SizeRuleDesk {
  rule: DraftSizeRule;
  /** Where its fields stand in the draft. */
  base: string;
  /** False: a line that is priced as all lines. */
  isOwn: boolean;
  /** All lines: thickness, width and length are changed together. */
  together: boolean;
  setTogether(together: boolean): void;
  change(change: (rule: DraftSizeRule) => void): void;
  makeOwn(): void;
  makeAsAll(): void;
}

export function useSizeRule(lineId: string | null, axis: Axis): SizeRuleDesk {
  const { desk } = useEditor();
  const { draft } = desk;
  const found = lineOf(draft.lines, lineId);
  const own = found ? found.line.sizes[axis] : draft.all.sizes[axis];
  const alike = AXES.every(
    (each) => JSON.stringify(draft.all.sizes[each]) === JSON.stringify(draft.all.sizes[axis]),
  );
  const [wanted, setTogether] = useState(alike);
  const together = lineId === null && wanted && alike;

  const rulesIn = (next: PracticalDraft): DraftSizeRule[] => {
    if (lineId === null) return together ? AXES.map((each) => next.all.sizes[each]) : [next.all.sizes[axis]];
    const rule = lineOf(next.lines, lineId)?.line.sizes[axis];
    return rule ? [rule] : [];
  };
  const setOwn = (next: PracticalDraft, rule: DraftSizeRule | null) => {
    const line = lineOf(next.lines, lineId)?.line;
    if (line) line.sizes[axis] = rule;
  };

  return {
    rule: own ?? draft.all.sizes[axis],
    base: found && own ? `lines.${found.index}.sizes.${axis}` : `all.sizes.${axis}`,
    isOwn: own !== null,
    together,
    setTogether(next) {
      setTogether(next);
      if (next && !alike) {
        desk.edit((changed) => {
          for (const each of AXES) changed.all.sizes[each] = structuredClone(changed.all.sizes[axis]);
        });
      }
    },
    change(change) {
      desk.edit((next) => {
        for (const rule of rulesIn(next)) {
          change(rule);
          if (rule.mirrored) rule.under = structuredClone(rule.over);
        }
      });
    },
    makeOwn: () => desk.edit((next) => setOwn(next, structuredClone(next.all.sizes[axis]))),
    makeAsAll: () => desk.edit((next) => setOwn(next, null)),
  };
}
