import type { Length } from '@/lib/length';
import type { Points, Reading } from './types';
import type { SizePrice, Worksheet } from './worksheet';

/** The nearest multiple of `step`, a tie going toward zero. Never −0. */
function roundTowardZero(deviation: Length, step: Length): Length {
  const rest = Math.abs(deviation % step);
  const down = Math.abs(deviation) - rest;
  const magnitude = 2 * rest > step ? down + step : down;
  return deviation < 0 ? 0 - magnitude : magnitude;
}

/** How far a reading in ticks is off the target, as it is scored. `shift` is the line's offset on that axis. */
export function findDeviation({ rubric }: Worksheet, price: SizePrice, ticks: Length, shift: Length): Length {
  const exact = ticks + shift - price.target;
  return rubric.readTo === null ? exact : roundTowardZero(exact, rubric.readTo);
}

/** The first step that reaches as far as the deviation. */
export function findStep({ steps }: Worksheet, price: SizePrice, deviation: Length): number {
  const distance = Math.abs(deviation);
  let step = deviation < 0 ? price.under : price.over;
  while (distance > (steps.edges[step] ?? 0)) step += 1;
  return step;
}

export function loseValue(sheet: Worksheet, price: SizePrice, ticks: Length, shift: Length): Points {
  const step = findStep(sheet, price, findDeviation(sheet, price, ticks, shift));
  return sheet.steps.loses[step] ?? 0;
}

export function isValueGross(sheet: Worksheet, price: SizePrice, ticks: Length, shift: Length): boolean {
  return Math.abs(findDeviation(sheet, price, ticks, shift)) > sheet.grossEdge;
}

/** What a dimension loses by whatever was recorded of it; one not read loses nothing for now. */
export function loseSize(
  sheet: Worksheet,
  price: SizePrice,
  reading: Reading | undefined,
  shift: Length,
): Points {
  if (reading?.kind === 'value') return loseValue(sheet, price, reading.ticks, shift);
  return reading?.kind === 'spoiled' ? price.spoiled : 0;
}

export function isSizeGross(
  sheet: Worksheet,
  price: SizePrice,
  reading: Reading | undefined,
  shift: Length,
): boolean {
  return reading?.kind === 'value' && isValueGross(sheet, price, reading.ticks, shift);
}
