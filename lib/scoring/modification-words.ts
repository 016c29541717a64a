import { excusedAxes, type Modification } from './modification';
import { formatFactor } from './modification-factor';
import { AXES, type Axis, type Points } from './types';

interface NamedLine {
  lineId: string;
  label: string;
}

/**
 * What a modification modifies, a phrase for each thing, in the order bands, sizes, checks. `lines` names the lines of
 * the sitting's version; a line it does not name is left out, as it has no effect there.
 *
 * @example sayModification({ format: 1, widen: { num: 3, den: 2 }, excused: [], checks: [] }, []) // ['bands 1.5 times as wide']
 */
export function sayModification(modification: Modification, lines: readonly NamedLine[]): string[] {
  const { widen, checks } = modification;
  return [
    ...(widen.num === widen.den ? [] : [`bands ${formatFactor(widen)} times as wide`]),
    ...sayExcused(modification, lines),
    ...checks.map(
      ({ label, lose }) =>
        `${label} ${lose ? `loses ${lose.slice(1).map(sayPoints).join(', ')}` : 'excused'}`,
    ),
  ];
}

function sayExcused(modification: Modification, lines: readonly NamedLine[]): string[] {
  const everywhere = AXES.filter((axis) =>
    modification.excused.some((each) => each.lineId === null && each.axis === axis),
  );
  const own = lines.map((line) => ({ ...line, axes: excusedAxes(line.lineId, modification) }));
  const whole = own.filter(({ axes }) => axes.length === AXES.length).map(({ label }) => label);
  const parts = own
    .filter(({ axes }) => axes.length < AXES.length)
    .map(({ label, axes }) => ({ label, axes: axes.filter((axis) => !everywhere.includes(axis)) }))
    .filter(({ axes }) => axes.length > 0);
  return [
    ...(whole.length > 0 ? [`${join(whole)} excused`] : []),
    ...(everywhere.length > 0 ? [`${join<Axis>(everywhere)} of every line excused`] : []),
    ...parts.map(({ label, axes }) => `${join<Axis>(axes)} of ${label} excused`),
  ];
}

/** Hundredths of a point as people write points. */
function sayPoints(points: Points): string {
  return String(points / 100);
}

function join<Word extends string>(words: readonly Word[]): string {
  return words.length < 2 ? (words[0] ?? '') : `${words.slice(0, -1).join(', ')} and ${words.at(-1)}`;
}
