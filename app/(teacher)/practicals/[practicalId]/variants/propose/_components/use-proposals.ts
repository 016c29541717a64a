'use client';

import { useState } from 'react';
import type { ProposedVariantsView } from '@/lib/data/practicals/propose-variants';
import { type Length, parseLength } from '@/lib/length';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import { judgeVariant, type VariantJudgement } from '@/lib/practicals/propose-variants-judge';
import type { OtherCutList } from '@/lib/practicals/propose-variants-types';
import type { Axis } from '@/lib/scoring';
import type { CutList } from '@/lib/scoring/rubric-form';

export type MovingAxis = Exclude<Axis, 'thickness'>;

/** What is typed of a variant: by "line axis", only where it is otherwise than proposed. */
interface Choice {
  isTaken: boolean;
  typed: Record<string, string>;
}

export interface Proposed {
  letter: string;
  isTaken: boolean;
  /** With the sizes as typed, as far as they can be read. */
  cutList: CutList;
  /** Why a typed size cannot be used, by "line axis". */
  errors: Map<string, string>;
  isChanged: boolean;
  judgement: VariantJudgement;
  textAt(lineId: string, axis: MovingAxis): string;
}

export const sizeKey = (lineId: string, axis: MovingAxis) => `${lineId} ${axis}`;

/** The proposals as a teacher changes and chooses them; what is changed is judged again at once. */
export function useProposals(view: ProposedVariantsView) {
  const { unit, original, proposals, others } = view;
  const [choices, setChoices] = useState<Record<string, Choice>>({});
  const choiceOf = (letter: string): Choice => choices[letter] ?? { isTaken: true, typed: {} };

  function change(letter: string, next: Partial<Choice>) {
    setChoices((before) => {
      const choice = before[letter] ?? { isTaken: true, typed: {} };
      return { ...before, [letter]: { ...choice, ...next, typed: { ...choice.typed, ...next.typed } } };
    });
  }

  const read = proposals.map(({ letter, cutList }) => {
    const { typed, isTaken } = choiceOf(letter);
    return { letter, isTaken, typed, proposed: cutList, ...readSizes(cutList, typed, unit) };
  });
  const shown = read.map(({ letter, isTaken, typed, proposed, cutList, errors }): Proposed => {
    const apart = read
      .filter((each) => each.letter !== letter && each.isTaken)
      .map((each): OtherCutList => ({ name: `variant ${each.letter}`, cutList: each.cutList }));
    const all = [{ name: 'the original', cutList: original.task.cutList }, ...others, ...apart];
    return {
      ...{ letter, isTaken, cutList, errors },
      isChanged: JSON.stringify(proposed) !== JSON.stringify(cutList) || errors.size > 0,
      judgement: judgeVariant(original.task, original.rubric, cutList, all),
      textAt(lineId, axis) {
        const line = proposed.lines.find(({ id }) => id === lineId);
        return typed[sizeKey(lineId, axis)] ?? (line ? lengthAsTyped(line.target[axis], unit) : '');
      },
    };
  });
  return {
    shown,
    type: (letter: string, lineId: string, axis: MovingAxis, text: string) =>
      change(letter, { typed: { [sizeKey(lineId, axis)]: text } }),
    take: (letter: string, isTaken: boolean) => change(letter, { isTaken }),
  };
}

function readSizes({ lines }: CutList, typed: Record<string, string>, unit: 'in' | 'mm') {
  const errors = new Map<string, string>();
  const readAt = (lineId: string, axis: MovingAxis, proposed: Length) => {
    const key = sizeKey(lineId, axis);
    const text = typed[key];
    if (text === undefined) return proposed;
    const size = parseLength(text, unit);
    if (size.ok && size.ticks > 0) return size.ticks;
    errors.set(key, size.ok ? 'A size is more than nothing.' : size.reason);
    return proposed;
  };
  const cutList = {
    lines: lines.map((line) => {
      const width = readAt(line.id, 'width', line.target.width);
      const length = readAt(line.id, 'length', line.target.length);
      return { ...line, target: { ...line.target, width, length } };
    }),
  };
  return { cutList, errors };
}
