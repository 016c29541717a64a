import { AXES, type Line } from '@/lib/scoring';
import { pieceRows, policyRows, wholeRows } from './compare-rows';
import { compareSizes, type MatchedLine } from './compare-sizes';
import type { Compared, Phrase, RubricComparison } from './compare-types';
import { otherSentence, priceSentences } from './compare-words';
import type { Task } from './task';

/** What makes two cut lists one task: how many pieces of which sizes, whatever they are called and in any order. */
export function cutListSignature(task: Task): string {
  const lines = task.cutList.lines.map(({ quantity, target }) =>
    [quantity, ...AXES.map((axis) => target[axis])].join(' '),
  );
  return lines.sort().join('; ');
}

/**
 * Lays two or more rubrics of one cut list side by side: every price, check and policy as a row, the exact stretches
 * of deviation on which their prices part, and sentences on where and by how much. `same` means that no recorded
 * attempt could ever score differently under one than under another, redo and prediction included.
 * Throws a RangeError for fewer than two, or for cut lists that are not one task.
 */
export function compareRubrics(compared: readonly Compared[]): RubricComparison {
  const lines = matchLines(compared);
  const sizes = compareSizes(
    lines,
    compared.map(({ rubric }) => rubric.margin),
  );
  const pieces = pieceRows(lines);
  const whole = wholeRows(compared);
  const policies = policyRows(compared);
  const prices = priceSentences(
    sizes,
    compared.map(({ label }) => label),
  );
  const others = [...pieces, ...whole, ...policies];
  const rows = [...sizes.flatMap((group) => group.rows), ...others];
  const same = rows.every(({ differs }) => !differs) && sizes.every(({ spans }) => spans.length === 0);
  const sentences: Phrase[] = [...prices, ...otherSentence(others, prices.length > 0)];
  return {
    same,
    sentences: same ? [['No difference: every reading costs the same under each of them.']] : sentences,
    sizes,
    pieces,
    whole,
    policies,
  };
}

function matchLines(compared: readonly Compared[]): MatchedLine[] {
  const [first, ...others] = compared;
  if (!first || others.length === 0) throw new RangeError('A comparison needs two rubrics.');
  const signature = cutListSignature(first.task);
  if (others.some(({ task }) => cutListSignature(task) !== signature)) {
    throw new RangeError('The rubrics are not of one cut list.');
  }
  const unmatched = others.map(({ rubric }) => [...rubric.lines]);
  return first.rubric.lines.map((line) => [line, ...unmatched.map((lines) => takeLike(lines, line))]);
}

/** Takes out the line that asks for the same pieces: the one of the same id if it does, else the first that does. */
function takeLike(lines: Line[], wanted: Line): Line {
  const alike = lines.filter(
    (line) =>
      line.quantity === wanted.quantity && AXES.every((axis) => line.target[axis] === wanted.target[axis]),
  );
  const line = alike.find(({ id }) => id === wanted.id) ?? alike[0];
  if (!line) throw new RangeError('The rubrics are not of one cut list.');
  lines.splice(lines.indexOf(line), 1);
  return line;
}
