import { AXES, type Check, type Line, type Points, type Rubric, type SizeRule } from '../types';

/** What one dimension loses at most: by a spoiled size, or past the last band of the dearer side. */
export function mostOfSize({ beyondOver, beyondUnder, cap }: SizeRule): Points {
  return Math.min(Math.max(beyondOver, beyondUnder), cap ?? Number.POSITIVE_INFINITY);
}

function mostOfCheck({ levels }: Check): Points {
  return Math.max(...levels.map(({ lose }) => lose));
}

/** What one present piece loses at most. With a gross limit that is its worth: it may be that far off. */
export function mostOfPresent(line: Line, { grossLimit }: Pick<Rubric, 'grossLimit'>): Points {
  if (grossLimit !== null) return line.worth;
  const sizes = AXES.reduce((sum, axis) => sum + mostOfSize(line.sizes[axis]), 0);
  const checks = line.checks.reduce((sum, check) => sum + mostOfCheck(check), 0);
  return Math.min(sizes + checks, line.worth);
}
