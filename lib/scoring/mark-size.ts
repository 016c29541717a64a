import type { Length } from '@/lib/length';
import type { Reading } from './types';
import type { SizeMark, SizePrice, Worksheet } from './worksheet';

/** The nearest multiple of `step`, a tie going toward zero. Never −0. */
function roundTowardZero(deviation: Length, step: Length): Length {
  const rest = Math.abs(deviation % step);
  const down = Math.abs(deviation) - rest;
  const magnitude = 2 * rest > step ? down + step : down;
  return deviation < 0 ? 0 - magnitude : magnitude;
}

/** Prices a reading in ticks against one dimension of a line. */
export function markValue(
  sheet: Worksheet,
  price: SizePrice,
  reading: Length,
  shift: Length,
  mark: SizeMark,
): void {
  const { readTo } = sheet.rubric;
  const { edges, loses } = sheet.steps;
  const exact = reading + shift - price.target;
  const deviation = readTo === null ? exact : roundTowardZero(exact, readTo);
  const distance = Math.abs(deviation);
  let step = deviation < 0 ? price.under : price.over;
  while (distance > (edges[step] ?? 0)) step += 1;
  mark.kind = 'value';
  mark.reading = reading;
  mark.deviation = deviation;
  mark.step = step;
  mark.gross = distance > sheet.grossEdge;
  mark.lose = loses[step] ?? 0;
}

/** Prices whatever was recorded of one dimension; nothing recorded loses nothing for now. */
export function markSize(
  sheet: Worksheet,
  price: SizePrice,
  reading: Reading | undefined,
  shift: Length,
  mark: SizeMark,
): void {
  if (reading?.kind === 'value') {
    markValue(sheet, price, reading.ticks, shift, mark);
    return;
  }
  mark.kind = reading === undefined ? 'unread' : reading.kind;
  mark.gross = false;
  mark.lose = mark.kind === 'spoiled' ? price.spoiled : 0;
}
