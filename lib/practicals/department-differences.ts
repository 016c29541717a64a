import { capital } from './change-words';
import { compareRubrics, cutListSignature } from './compare-rubrics';
import type { Compared, ComparedRow, Phrase } from './compare-types';
import { priceSentences, valueWords } from './compare-words';

type Written = Omit<Compared, 'label'>;

export interface DepartmentDifferences {
  /** No attempt can score differently under one than under the other. */
  same: boolean;
  /** Where they differ, a sentence each; empty when they are the same. */
  sentences: Phrase[];
}

const DEPARTMENT = 'the department';
const OTHER_PIECES = 'It asks for other pieces, so its prices are not set against the department’s.';
const OTHER_SIZES = 'It asks for other sizes of the same pieces.';

/**
 * Where a rubric differs from the one that the department approved. A variant, which has the same lines with other
 * sizes, is compared as if it had the approved sizes. Pure; never fails.
 *
 * @example departmentDifferences(approved, { ...approved, label: 'Okonjo' }) // { same: true, sentences: [] }
 */
export function departmentDifferences(approved: Written, own: Compared): DepartmentDifferences {
  const sameTask = cutListSignature(approved.task) === cutListSignature(own.task);
  const comparable = sameTask ? own : inSizesOf(approved, own);
  if (!comparable) return { same: false, sentences: [[OTHER_PIECES]] };
  const comparison = compareRubrics([{ ...approved, label: DEPARTMENT }, comparable]);
  const { same, sizes, pieces, whole, policies } = comparison;
  const prices = priceSentences(sizes, [DEPARTMENT, own.label]);
  const others = [...pieces, ...whole, ...policies].filter(({ differs }) => differs).map(rowSentence);
  const told = same ? [] : [...prices, ...others].map(capital);
  return { same: same && sameTask, sentences: sameTask ? told : [[OTHER_SIZES], ...told] };
}

/** "A redo counts up to: 100%, the department 90%." */
function rowSentence({ label, values }: ComparedRow): Phrase {
  const [theirs, own] = values.map(valueWords);
  return [...label, ': ', ...(own ?? []), `, ${DEPARTMENT} `, ...(theirs ?? []), '.'];
}

/** The same prices on the other's sizes, where both have the same lines. */
function inSizesOf(approved: Written, own: Compared): Compared | null {
  const targets = new Map(approved.task.cutList.lines.map((line) => [line.id, line]));
  const { lines } = own.task.cutList;
  const alike = lines.every(({ id, quantity }) => targets.get(id)?.quantity === quantity);
  if (!alike || lines.length !== targets.size) return null;
  const resize = <L extends { id: string; target: (typeof lines)[number]['target'] }>(line: L): L => {
    const target = targets.get(line.id)?.target ?? line.target;
    return { ...line, target: { ...target } };
  };
  return {
    ...own,
    task: { ...own.task, cutList: { ...own.task.cutList, lines: lines.map(resize) } },
    rubric: { ...own.rubric, lines: own.rubric.lines.map(resize) },
  };
}
