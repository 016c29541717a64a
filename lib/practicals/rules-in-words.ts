import type { Check, Line, Rubric } from '@/lib/scoring';
import type { PredictionPolicy, RedoPolicy, RubricForm } from '@/lib/scoring/rubric-form';
import { pointsAsTyped, shareAsTyped } from './as-typed';
import { isOneScale, pointsOfTotal, possiblePoints, totalPoints } from './both-scales';
import { levelWords } from './changes-in-checks';
import { joinWords } from './compare-sizes';
import type { Phrase } from './compare-types';

export interface RuleInWords {
  label: string;
  phrase: Phrase;
}

const points = (amount: number) => `${pointsAsTyped(amount)} ${amount === 100 ? 'point' : 'points'}`;

/** Everything that decides a score besides the prices of sizes, a sentence or two each. Lengths stay lengths. Pure. */
export function rulesInWords(rubric: Rubric, form: RubricForm): RuleInWords[] {
  const { late, redo, prediction } = form.policies;
  return [
    { label: 'total', phrase: [totalWords(rubric)] },
    { label: 'rounding', phrase: [roundingWords(rubric)] },
    { label: 'reading', phrase: readingWords(rubric) },
    { label: 'gross limit', phrase: grossWords(rubric) },
    ...checkRules(rubric),
    { label: 'thickness and width', phrase: [swapWords(rubric.lines)] },
    { label: 'pieces of a line', phrase: [setWords(rubric.lines)] },
    {
      label: 'late work',
      phrase: [
        late
          ? `Each day late takes ${late.perDay}% off the score, ${late.max}% at most.`
          : 'The days are recorded and cost nothing.',
      ],
    },
    { label: 'redo', phrase: [redoWords(redo)] },
    { label: 'prediction', phrase: predictionWords(prediction) },
  ];
}

function totalWords(rubric: Rubric): string {
  const possible = possiblePoints(rubric);
  const opening =
    rubric.basis === 'start'
      ? `The score starts from ${points(possible)}, and losses come off.`
      : `The pieces are worth ${points(possible)} together.`;
  if (isOneScale(rubric)) return opening;
  const total = totalPoints(rubric);
  const one = pointsAsTyped(pointsOfTotal(rubric, 100));
  return `${opening} That is scaled to ${pointsAsTyped(total)}: 1 of ${pointsAsTyped(possible)} is ${one} of ${pointsAsTyped(total)}.`;
}

function roundingWords({ roundTo, floor, ceiling }: Rubric): string {
  const lowest = floor > 0 ? ` Losses never take it below ${floor}%.` : '';
  const highest =
    ceiling > 100
      ? ` A bonus can lift it to ${ceiling}% of the total.`
      : ' No bonus lifts it above the total.';
  return `The score is rounded once, to ${points(roundTo)}, half up.${lowest}${highest}`;
}

function readingWords({ margin, readTo }: Rubric): Phrase {
  const free: Phrase =
    margin > 0
      ? ['Each price begins ', { ticks: margin }, ' past the edge of its band, for the instrument.']
      : ['Each price begins at the edge of its band.'];
  return readTo === null
    ? free
    : [...free, ' A deviation is first rounded to the nearest ', { ticks: readTo }, '.'];
}

function grossWords({ grossLimit }: Rubric): Phrase {
  return grossLimit === null
    ? ['None: however far off, a size costs no more than its price.']
    : ['A piece with a size more than ', { ticks: grossLimit }, ' off is not that part: it loses its worth.'];
}

/** Checks of pieces with the lines they are made on, then those of the whole work. */
function checkRules({ lines, workChecks }: Rubric): RuleInWords[] {
  const groups = new Map<string, { check: Check; labels: string[] }>();
  for (const { label, checks } of lines) {
    for (const check of checks) {
      const key = JSON.stringify(check);
      const group = groups.get(key) ?? { check, labels: [] };
      group.labels.push(label);
      groups.set(key, group);
    }
  }
  const rule = (check: Check, where: string): RuleInWords => ({
    label: `check: ${check.label}`,
    phrase: [`${where}: ${levelWords(check)}.`],
  });
  return [
    ...[...groups.values()].map(({ check, labels }) =>
      rule(check, labels.length === lines.length ? 'On every piece' : `On ${joinWords(labels)}`),
    ),
    ...workChecks.map((check) => rule(check, 'Once, for the whole work')),
  ];
}

function swapWords(lines: readonly Line[]): string {
  const yes = lines.filter(({ swap }) => swap);
  if (yes.length === lines.length) {
    return 'Thickness and width may be read either way round; the cheaper way counts.';
  }
  if (yes.length === 0) return 'Thickness and width are read as they are named.';
  return `On ${joinWords(yes.map(({ label }) => label))}, thickness and width may be read either way round.`;
}

function setWords(lines: readonly Line[]): string {
  const worst = lines.filter(({ set }) => set === 'worst');
  if (worst.length === 0) return 'Each piece is priced by itself.';
  if (worst.length === lines.length) return 'All present pieces of a line lose what the worst of them loses.';
  return `All present pieces of ${joinWords(worst.map(({ label }) => label))} lose what the worst of them loses; others are priced by themselves.`;
}

function redoWords(redo: RedoPolicy): string {
  if (redo.kind === 'average') {
    return `The mean of all attempts counts, rounded to ${points(redo.roundTo)}.`;
  }
  const which = redo.kind === 'higher' ? 'The higher score counts' : 'The last score counts';
  return redo.capPercent < 100
    ? `${which}; a redo counts up to ${redo.capPercent}% of the total.`
    : `${which}.`;
}

function predictionWords(policy: PredictionPolicy): Phrase {
  const { full, close, closeWithin, agreeShare, caughtShare, valueShare, agreeWithin } = policy;
  if (full === 0 && close === 0) return ['It brings no points.'];
  const second =
    close > 0 ? ` Else ${points(close)} if the two totals are within ${pointsAsTyped(closeWithin)}.` : '';
  return [
    `${points(full)} if ${shareAsTyped(agreeShare)} of the sizes agree within `,
    { ticks: agreeWithin },
    `, ${shareAsTyped(caughtShare)} of the off-band ones were caught and ${shareAsTyped(valueShare)} were read by number.${second}`,
  ];
}
