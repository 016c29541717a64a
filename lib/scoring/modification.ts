import type { Length } from '@/lib/length';
import { type Attempt, AXES, type Axis, type Line, type Piece, type Points, type Rubric } from './types';

/**
 * What is priced otherwise for one student: wider bands, sizes that are not held against them, checks that cost
 * another price. `lineId` or `axis` null: on every line, on every axis. `checks` are named by their label, as the same
 * check goes by different ids in different practicals; `lose` null: the check is not held against the student.
 */
export interface Modification {
  format: 1;
  widen: { num: number; den: number };
  excused: { lineId: string | null; axis: Axis | null }[];
  checks: { label: string; lose: Points[] | null }[];
}

/**
 * The rubric under a modification: every band and the gross limit wider by `widen` (to the nearest tick, half up),
 * the named checks at their other prices. The total stays: where it was the sum of the worths it is set to that sum.
 * Line ids and labels that the rubric does not know have no effect. Does not change its arguments.
 *
 * @example modifyRubric(rubric, { format: 1, widen: { num: 2, den: 1 }, excused: [], checks: [] })
 */
export function modifyRubric(rubric: Rubric, modification: Modification): Rubric {
  const { widen } = modification;
  return {
    ...rubric,
    outOf: rubric.outOf ?? (rubric.basis === 'worth' ? sumOfWorths(rubric) : null),
    grossLimit: rubric.grossLimit === null ? null : wider(rubric.grossLimit, widen),
    lines: rubric.lines.map((line) => modifyLine(line, modification)),
    workChecks: rubric.workChecks.map((check) => reprice(check, modification)),
  };
}

/**
 * The attempt as a modification counts it: pieces of an excused line are excused, sizes on an excused axis too,
 * whatever was or was not recorded of them. Does not change its arguments.
 */
export function modifyAttempt(rubric: Rubric, attempt: Attempt, { excused }: Modification): Attempt {
  if (excused.length === 0) return attempt;
  const pieces: Piece[] = [];
  for (const line of rubric.lines) {
    const axes = AXES.filter((axis) =>
      excused.some((each) => isOrAll(each.lineId, line.id) && isOrAll(each.axis, axis)),
    );
    const listed = new Map(
      attempt.pieces.filter(({ lineId }) => lineId === line.id).map((piece) => [piece.ordinal, piece]),
    );
    for (let ordinal = 1; ordinal <= line.quantity; ordinal++) {
      const piece = listed.get(ordinal);
      if (axes.length === AXES.length) {
        pieces.push({ lineId: line.id, ordinal, state: 'excused', sizes: {}, checks: {} });
      } else if (piece) {
        const kept = axes.map((axis) => [axis, { kind: 'excused' as const }]);
        pieces.push({ ...piece, sizes: { ...piece.sizes, ...Object.fromEntries(kept) } });
      }
    }
  }
  return { ...attempt, pieces };
}

const isOrAll = <T>(named: T | null, one: T): boolean => named === null || named === one;

function sumOfWorths({ lines }: Rubric): Points {
  return lines.reduce((sum, { worth, quantity }) => sum + worth * quantity, 0);
}

function modifyLine(line: Line, modification: Modification): Line {
  const { widen } = modification;
  const bands = (side: Line['sizes']['length']['over']) =>
    side.map(({ within, lose }) => ({ within: wider(within, widen), lose }));
  const size = (axis: Axis) => ({
    ...line.sizes[axis],
    over: bands(line.sizes[axis].over),
    under: bands(line.sizes[axis].under),
  });
  return {
    ...line,
    sizes: { thickness: size('thickness'), width: size('width'), length: size('length') },
    checks: line.checks.map((check) => reprice(check, modification)),
  };
}

/** Half up; exact, as 10 m times the largest numerator stays below 2^53. */
function wider(length: Length, { num, den }: Modification['widen']): Length {
  return Math.floor((2 * length * num + den) / (2 * den));
}

function reprice(check: Line['checks'][number], { checks }: Modification): Line['checks'][number] {
  const other = checks.find(({ label }) => sameLabel(label, check.label));
  if (!other) return check;
  const lose = other.lose ?? check.levels.map(() => 0);
  return {
    ...check,
    assume: other.lose === null ? (check.assume ?? 0) : check.assume,
    levels: check.levels.map((level, index) => ({ ...level, lose: lose[index] ?? level.lose })),
  };
}

function sameLabel(one: string, other: string): boolean {
  return one.trim().toLowerCase() === other.trim().toLowerCase();
}
