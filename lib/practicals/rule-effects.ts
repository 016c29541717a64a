import type { Length } from '@/lib/length';
import {
  type Attempt,
  type Check,
  combineAttempts,
  type Line,
  type Points,
  type Rubric,
  scoreAttempt,
} from '@/lib/scoring';
import type { RubricForm, Share } from '@/lib/scoring/rubric-form';
import { pointsAsTyped } from './as-typed';
import { isOneScale, pointsOfTotal, possiblePoints, totalPoints } from './both-scales';
import type { Phrase } from './compare-types';
import { dearestLevel, exampleAttempts, targetAttempt } from './example-attempts';
import { explainScore } from './explain-score';
import { countSizes, pieceLabel } from './task';

/** What each rule of the whole does under this rubric, on an example that the engine scores. */
export interface RuleEffects {
  scale: Phrase;
  rounding: Phrase;
  floor: Phrase;
  ceiling: Phrase;
  swap: Phrase;
  set: Phrase;
  margin: Phrase;
  gross: Phrase;
  readTo: Phrase;
  redo: Phrase;
  late: Phrase;
  prediction: Phrase;
  close: Phrase;
  work: Phrase;
}

const DAYS = 3;

/**
 * A sentence for each rule of the whole: what it makes of a perfect, a typical or a lost set under the rubric as it is.
 * Every score comes from `scoreAttempt` or `combineAttempts`. Pure.
 */
export function ruleEffects(rubric: Rubric, form: RubricForm): RuleEffects {
  return {
    scale: scaleEffect(rubric),
    rounding: roundingEffect(rubric),
    floor: [`A set with nothing in it scores ${say(scoreOf(rubric, nothing(rubric)))}.`],
    ceiling: ceilingEffect(rubric, form),
    swap: swapEffect(rubric),
    set: setEffect(rubric),
    margin: marginEffect(rubric),
    gross: grossEffect(rubric),
    readTo: readToEffect(rubric),
    redo: redoEffect(rubric, form),
    late: lateEffect(rubric),
    prediction: predictionEffect(rubric, form),
    close: closeEffect(form),
    work: workEffect(rubric),
  };
}

function say(points: Points | null): string {
  if (points === null) return 'nothing';
  return points < 0 ? `−${pointsAsTyped(-points)}` : pointsAsTyped(points);
}

function scoreOf(rubric: Rubric, attempt: Attempt): Points | null {
  return scoreAttempt(rubric, attempt).provisional;
}

function typical(rubric: Rubric): Attempt {
  return exampleAttempts(rubric).find(({ id }) => id === 'typical')?.attempt ?? targetAttempt(rubric);
}

/** Every piece missing and every check of the work at its worst. */
function nothing(rubric: Rubric): Attempt {
  const attempt = targetAttempt(rubric);
  const pieces = attempt.pieces.map((piece) => ({
    ...piece,
    state: 'missing' as const,
    sizes: {},
    checks: {},
  }));
  return { ...attempt, pieces, work: worstOf(rubric.workChecks) };
}

function worstOf(checks: readonly Check[]): Record<string, number> {
  return Object.fromEntries(checks.map((check) => [check.id, dearestLevel(check)]));
}

/** The first piece of a line off its targets, all else on target. */
function withOff(
  rubric: Rubric,
  line: Line,
  off: { thickness?: Length; width?: Length; length?: Length },
): Attempt {
  const attempt = targetAttempt(rubric);
  const piece = attempt.pieces.find(({ lineId, ordinal }) => lineId === line.id && ordinal === 1);
  for (const axis of ['thickness', 'width', 'length'] as const) {
    const ticks = Math.max(1, line.target[axis] + (off[axis] ?? 0));
    if (piece) piece.sizes[axis] = { kind: 'value', ticks };
  }
  return attempt;
}

function lostBy(rubric: Rubric, attempt: Attempt): Points {
  return scoreAttempt(rubric, attempt).lost;
}

function points(amount: Points): string {
  return amount === 0 ? 'nothing' : say(amount);
}

function scaleEffect(rubric: Rubric): Phrase {
  const [possible, total] = [possiblePoints(rubric), totalPoints(rubric)];
  const worths = rubric.lines.reduce((sum, { worth, quantity }) => sum + worth * quantity, 0);
  const counted =
    rubric.basis === 'start'
      ? `Losses come off ${say(possible)}; the pieces together are worth ${say(worths)}.`
      : `The pieces are worth ${say(possible)} together.`;
  const scaled = isOneScale(rubric)
    ? ' A point lost is a point of the score.'
    : ` 1 of ${say(possible)} is ${say(pointsOfTotal(rubric, 100))} of ${say(total)}.`;
  return [counted + scaled];
}

function roundingEffect(rubric: Rubric): Phrase {
  const sheet = scoreAttempt(rubric, typical(rubric));
  const { kept } = explainScore(rubric, sheet, 0);
  return [`The typical set keeps ${say(kept.ofTotal)} and scores ${say(sheet.provisional)}.`];
}

function ceilingEffect(rubric: Rubric, { policies }: RubricForm): Phrase {
  const bonus = policies.prediction.full;
  const best = scoreOf(rubric, { ...targetAttempt(rubric), bonus });
  return [`A perfect set with a bonus of ${say(bonus)} scores ${say(best)} of ${say(totalPoints(rubric))}.`];
}

function swapEffect(rubric: Rubric): Phrase {
  const line = rubric.lines.find(({ target }) => target.thickness !== target.width);
  if (!line) return ['All pieces are as thick as they are wide: it changes nothing here.'];
  const apart = line.target.width - line.target.thickness;
  const attempt = withOff(rubric, line, { thickness: apart, width: -apart });
  const { thickness, width } = line.target;
  return [
    `${pieceLabel(line, 1)} read `,
    { ticks: width },
    ' by ',
    { ticks: thickness },
    ` instead of `,
    { ticks: thickness },
    ' by ',
    { ticks: width },
    ` loses ${points(lostBy(rubric, attempt))}.`,
  ];
}

function setEffect(rubric: Rubric): Phrase {
  const line = rubric.lines.find(({ quantity }) => quantity > 1);
  if (!line) return ['No line has more than one piece: it changes nothing here.'];
  const off = stepOff(line);
  const lost = lostBy(rubric, withOff(rubric, line, { length: -off }));
  return [
    `One ${line.label} of ${line.quantity} `,
    { ticks: off },
    ` short: the line loses ${points(lost)}.`,
  ];
}

/** As far off as the end of the first band that costs. */
function stepOff(line: Line): Length {
  const { under } = line.sizes.length;
  return under.find(({ lose }) => lose > 0)?.within ?? (under.at(-1)?.within ?? 0) * 2 + 1;
}

function marginEffect(rubric: Rubric): Phrase {
  const [line] = rubric.lines;
  if (!line) return [];
  const edge = line.sizes.length.over[0]?.within ?? 0;
  const [on, past] = [edge + rubric.margin, edge + rubric.margin + 1].map((length) =>
    lostBy(rubric, withOff(rubric, line, { length })),
  );
  return [
    ...edgeWords(line, edge, rubric.margin),
    ` over loses ${points(on ?? 0)}, a hair more ${points(past ?? 0)}.`,
  ];
}

/** "base, length: 1/32 and 0.002". */
function edgeWords(line: Line, edge: Length, margin: Length): Phrase {
  const name = `${pieceLabel(line, 1)}, length: `;
  return margin === 0 ? [name, { ticks: edge }] : [name, { ticks: edge }, ' and ', { ticks: margin }];
}

function grossEffect(rubric: Rubric): Phrase {
  const [line] = rubric.lines;
  if (!line) return [];
  if (rubric.grossLimit === null) return ['No size is too far off to be that part.'];
  const { grossLimit, margin } = rubric;
  const [on, past] = [grossLimit + margin, grossLimit + margin + 1].map((length) =>
    lostBy(rubric, withOff(rubric, line, { length })),
  );
  return [
    ...edgeWords(line, grossLimit, margin),
    ` over loses ${points(on ?? 0)}, a hair more ${points(past ?? 0)}, all it is worth.`,
  ];
}

function readToEffect(rubric: Rubric): Phrase {
  const [line] = rubric.lines;
  if (!line || rubric.readTo === null) return ['Every deviation is scored as it was read.'];
  const off = Math.ceil(rubric.readTo * 0.7);
  const attempt = withOff(rubric, line, { length: off });
  const used = scoreAttempt(rubric, attempt).pieces[0]?.sizes?.length.deviation ?? 0;
  return [`A length `, { ticks: off }, ' over is scored as ', { ticks: used }, ' over.'];
}

function redoEffect(rubric: Rubric, { policies }: RubricForm): Phrase {
  const total = totalPoints(rubric);
  const scores = [
    { score: Math.round((0.62 * total) / 100) * 100, total },
    { score: Math.round((0.97 * total) / 100) * 100, total },
  ];
  const counts = combineAttempts(policies.redo, scores);
  return [`First ${say(scores[0]?.score ?? 0)}, then ${say(scores[1]?.score ?? 0)}: ${say(counts)} counts.`];
}

function lateEffect(rubric: Rubric): Phrase {
  const attempt = typical(rubric);
  const onTime = scoreOf(rubric, attempt);
  const late = scoreOf(rubric, { ...attempt, daysLate: DAYS });
  return [
    onTime === late
      ? `The typical set keeps its ${say(onTime)}, however late it comes.`
      : `The typical set scores ${say(onTime)}, and ${say(late)} when it comes ${DAYS} days late.`,
  ];
}

/** The least whole number that is such a share of n. */
function least({ num, den }: Share, n: number): number {
  return Math.ceil((n * num) / den);
}

function predictionEffect(rubric: Rubric, { policies }: RubricForm): Phrase {
  const { agreeShare, caughtShare, valueShare, full, agreeWithin } = policies.prediction;
  const sizes = countSizes(rubric);
  return [
    `Of ${sizes} sizes, ${least(agreeShare, sizes)} within `,
    { ticks: agreeWithin },
    ` of yours, ${least(valueShare, sizes)} of them read by number, and of 6 off-band sizes ` +
      `${least(caughtShare, 6)} caught: ${say(full)} more.`,
  ];
}

function closeEffect({ policies }: RubricForm): Phrase {
  const { close, closeWithin } = policies.prediction;
  return [
    close === 0
      ? 'Guessing the total alone earns nothing.'
      : `Else, predicted 85 and measured ${say(8500 - closeWithin)}: ${say(close)} more; a point further off: nothing.`,
  ];
}

function workEffect(rubric: Rubric): Phrase {
  if (rubric.workChecks.length === 0) return [];
  const lost = lostBy(rubric, { ...targetAttempt(rubric), work: worstOf(rubric.workChecks) });
  return [`Failing ${rubric.workChecks.length === 1 ? 'it' : 'all of them'} loses ${inBoth(rubric, lost)}.`];
}

/** "2 of 63, 3.17 of 100". */
function inBoth(rubric: Rubric, lost: Points): string {
  const own = `${say(lost)} of ${say(possiblePoints(rubric))}`;
  return isOneScale(rubric)
    ? own
    : `${own}, ${say(pointsOfTotal(rubric, lost))} of ${say(totalPoints(rubric))}`;
}

/** What one piece of a line loses that is on target and fails each of its checks at its dearest; empty without checks. */
export function checksEffect(rubric: Rubric, lineId: string): string {
  const line = rubric.lines.find(({ id }) => id === lineId);
  if (!line || line.checks.length === 0) return '';
  const attempt = targetAttempt(rubric);
  const piece = attempt.pieces.find((each) => each.lineId === lineId && each.ordinal === 1);
  if (piece) piece.checks = worstOf(line.checks);
  const faults =
    line.checks.length === 1
      ? `fails ${line.checks[0]?.label}`
      : `fails ${line.checks.length === 2 ? 'both' : `all ${line.checks.length}`} checks`;
  return `${pieceLabel(line, 1)} on target that ${faults} loses ${inBoth(rubric, lostBy(rubric, attempt))}.`;
}
