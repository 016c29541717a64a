import { AXES, type Rubric } from '@/lib/scoring';
import { cellKey } from '../cells';
import { type CellEvent, deriveCells } from '../derive';

/**
 * Why own readings cannot be locked as they stand: something is left open under each of the rubrics, or the receipt is
 * of other readings. Told by the first rubric, the present one.
 */
export function refuseLock(
  rubrics: readonly Rubric[],
  recorded: readonly CellEvent[],
  given: string,
  receipt: string,
): string | null {
  const [open = 0, ...others] = rubrics.map((rubric) => countOpenSizes(rubric, recorded));
  if (open > 0 && others.every((each) => each > 0)) {
    return `${open === 1 ? 'One size is' : `${open} sizes are`} neither recorded nor marked “couldn’t read”.`;
  }
  return given === receipt
    ? null
    : 'The receipt does not fit the readings that arrived. Nothing was lost; lock again.';
}

/** Sizes that hold neither a value, nor spoiled, nor "couldn't read", on pieces that are not missing. */
function countOpenSizes(rubric: Rubric, recorded: readonly CellEvent[]): number {
  const cells = deriveCells(recorded, 'own');
  let open = 0;
  for (const line of rubric.lines) {
    for (let ordinal = 1; ordinal <= line.quantity; ordinal += 1) {
      const at = (what: string) => cells.get(cellKey({ lineId: line.id, ordinal, what }))?.value ?? null;
      const piece = at('piece');
      if (piece?.kind === 'state' && piece.state === 'missing') continue;
      for (const axis of AXES) {
        const value = at(axis);
        if (value === null || value.kind === 'cleared') open += 1;
      }
    }
  }
  return open;
}
