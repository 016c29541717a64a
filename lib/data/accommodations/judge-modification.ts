import { AXES, type Rubric } from '@/lib/scoring';
import { excusedAxes, isSameLabel, type Modification } from '@/lib/scoring/modification';

export interface WhyNot {
  field: 'excused' | 'checks';
  message: string;
}

/** A total can hold so much; a larger sum of worths could not be kept when lines are excused. */
const MOST_TOTAL = 1_000_000;

/** What of a modification cannot be for every sitting of a term. */
export function whyNotForTerm({ excused }: Modification): WhyNot | null {
  return excused.some(({ lineId }) => lineId !== null)
    ? { field: 'excused', message: 'Lines can be excused in one sitting only; for the term excuse an axis.' }
    : null;
}

/** What of a modification this sitting's rubric cannot have. */
export function whyNotForSitting(modification: Modification, rubric: Rubric): WhyNot | null {
  const { excused, checks } = modification;
  if (excused.some(({ lineId }) => lineId !== null && !rubric.lines.some(({ id }) => id === lineId))) {
    return {
      field: 'excused',
      message: 'A line is not in this sitting’s rubric any more. Look at it again.',
    };
  }
  const labels = [...rubric.lines.flatMap((line) => line.checks), ...rubric.workChecks].map(
    ({ label }) => label,
  );
  if (checks.some(({ label }) => !labels.some((each) => isSameLabel(each, label)))) {
    return {
      field: 'checks',
      message: 'A check is not in this sitting’s rubric any more. Look at it again.',
    };
  }
  const left = rubric.lines.filter(({ id }) => excusedAxes(id, modification).length < AXES.length);
  if (left.length === rubric.lines.length) return null;
  if (!left.some(({ worth }) => rubric.basis === 'start' || worth > 0)) {
    return {
      field: 'excused',
      message: 'This leaves nothing to score. Keep one line, or excuse the student in the sitting.',
    };
  }
  const sum = rubric.lines.reduce((before, { worth, quantity }) => before + worth * quantity, 0);
  return rubric.basis === 'worth' && rubric.outOf === null && sum > MOST_TOTAL
    ? {
        field: 'excused',
        message: 'This practical has more than 10 000 points and no total: lines cannot be excused.',
      }
    : null;
}
