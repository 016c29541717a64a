import type { SharedVersionView } from '@/lib/data/department/read-shared-version';
import type { EffectScale } from '@/lib/practicals/rubric-effect';
import { sayPeriod, tenths } from '../../_components/words';

/** The effect in a sentence: which sections would stand higher, lower or as they do now, in the mean. */
export function sayVerdict({ sections, scale }: Pick<SharedVersionView, 'sections' | 'scale'>): string {
  const told = sections.flatMap(({ effect, period }) => (effect ? [{ period, change: effect.change }] : []));
  if (told.length === 0) return 'Every section has too few students to show what it would do.';
  if (sections.every(({ effect }) => effect === null || effect.changes.every((change) => change === 0))) {
    return 'No score would change.';
  }
  if (told.every(({ change }) => change === 0)) {
    return told.length === 1 ? 'The mean would stay as it is.' : 'Every section’s mean would stay as it is.';
  }
  const unit = scale.kind === 'points' ? '' : ' percent';
  const words = told.map(({ period, change }) => {
    if (change === 0) return `${sayPeriod(period)} would stay`;
    return `${sayPeriod(period)} would stand ${tenths(change)}${unit} ${change > 0 ? 'higher' : 'lower'}`;
  });
  const last = words.pop() ?? '';
  const sentence = words.length > 0 ? `${words.join(', ')} and ${last}` : last;
  return `${sentence.charAt(0).toUpperCase()}${sentence.slice(1)}.`;
}

/** On what scale the scores stand. */
export function sayScale(scale: EffectScale): string {
  return scale.kind === 'points'
    ? `Scores are points of ${tenths(scale.total).replace(/\.0$/, '')}.`
    : 'The totals differ, so scores are shares of each total, in percent.';
}

export interface ChangeScale {
  from: number;
  to: number;
}

/** Past the last mark, so that its number has room. */
const ROOM = 2;

/** One scale for all sections: from the greatest loss to the greatest gain by fives, at least ten to each side. */
export function changeScale(changes: readonly (readonly number[])[]): ChangeScale {
  const whole = changes.flat().map((change) => change / 100);
  const from = Math.min(-10, ...whole);
  const to = Math.max(10, ...whole);
  return { from: Math.floor(from / 5) * 5 - ROOM, to: Math.ceil(to / 5) * 5 + ROOM };
}
