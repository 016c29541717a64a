import { AXES, type Check, type Line, type Rubric } from '@/lib/scoring';
import type { Cell, CellValue, Side } from './cells';

const ATTEMPT_KINDS: Record<string, { side: Side; kinds: readonly CellValue['kind'][] }> = {
  '@standing': { side: 'bench', kinds: ['standing', 'cleared'] },
  '@finish': { side: 'bench', kinds: ['finish', 'cleared'] },
  '@receipt': { side: 'bench', kinds: ['receipt', 'cleared'] },
  '@days-late': { side: 'bench', kinds: ['days-late', 'cleared'] },
  '@zero': { side: 'bench', kinds: ['zero'] },
  '@lock': { side: 'own', kinds: ['lock'] },
};

const SIZE_KINDS: Record<Side, readonly CellValue['kind'][]> = {
  bench: ['value', 'gauged', 'spoiled', 'excused', 'cleared'],
  own: ['value', 'spoiled', 'unreadable', 'cleared'],
};

const PIECE_STATES: Record<Side, readonly string[]> = {
  bench: ['present', 'missing', 'held', 'excused'],
  own: ['present', 'missing'],
};

/**
 * Why none of these rubrics has such a cell, or why the cell cannot hold this value on this side; null when under one
 * of them it can. Told by the first rubric, the one the sitting stands under.
 */
export function refuseCell(
  rubrics: readonly Rubric[],
  side: Side,
  cell: Cell,
  value: CellValue,
): string | null {
  const reasons = rubrics.map((rubric) => refuseUnder(rubric, side, cell, value));
  return reasons.includes(null) ? null : (reasons[0] ?? 'There is no rubric.');
}

function refuseUnder(rubric: Rubric, side: Side, cell: Cell, value: CellValue): string | null {
  if (cell.what.startsWith('@')) return refuseAttemptCell(side, cell, value);
  if (cell.lineId === '') {
    if (cell.ordinal !== 0) return 'A check of the whole work has no piece number.';
    return refuseCheck(rubric.workChecks, 'This rubric', cell.what, value);
  }
  const line = rubric.lines.find(({ id }) => id === cell.lineId);
  if (!line) return `This rubric has no line “${cell.lineId}”.`;
  if (cell.ordinal < 1 || cell.ordinal > line.quantity) {
    return `The line “${line.label}” has ${line.quantity === 1 ? 'one piece' : `${line.quantity} pieces`}, no number ${cell.ordinal}.`;
  }
  return refusePieceCell(line, side, cell, value);
}

function refuseAttemptCell(side: Side, cell: Cell, value: CellValue): string | null {
  const rule = Object.hasOwn(ATTEMPT_KINDS, cell.what) ? ATTEMPT_KINDS[cell.what] : undefined;
  if (!rule || cell.lineId !== '' || cell.ordinal !== 0) return 'An attempt has no such cell.';
  if (rule.side !== side) return 'This is not recorded on this side.';
  return rule.kinds.includes(value.kind) ? null : 'This cell cannot hold that.';
}

function refusePieceCell(line: Line, side: Side, cell: Cell, value: CellValue): string | null {
  if (AXES.some((axis) => axis === cell.what)) {
    return SIZE_KINDS[side].includes(value.kind) ? null : 'A size cannot be recorded as that here.';
  }
  if (cell.what === 'piece') {
    if (value.kind === 'cleared') return null;
    return value.kind === 'state' && PIECE_STATES[side].includes(value.state)
      ? null
      : 'A piece cannot be recorded as that here.';
  }
  return refuseCheck(line.checks, `The line “${line.label}”`, cell.what, value);
}

function refuseCheck(checks: readonly Check[], owner: string, what: string, value: CellValue): string | null {
  const check = checks.find(({ id }) => id === what);
  if (!check) return `${owner} has no check “${what}”.`;
  if (value.kind === 'cleared') return null;
  if (value.kind !== 'level') return 'A check is recorded by its level.';
  return value.level < check.levels.length ? null : `“${check.label}” has no such level.`;
}
