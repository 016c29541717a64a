import type { Length } from '@/lib/length';
import { findShift, type Shift } from './mark-piece';
import { findDeviation, findStep, loseSize } from './price-size';
import {
  type Attempt,
  AXES,
  type CheckSheet,
  type Piece,
  type PieceSheet,
  type Reading,
  type SizeSheet,
  type Unread,
} from './types';
import type { PieceMark, PricedChecks, PricedLine, SizePrice, Worksheet } from './worksheet';

/** Each check with its recorded level, else the assumed one, else none. */
export function writeChecks({ list }: PricedChecks, recorded: Record<string, number>): CheckSheet[] {
  return list.map(({ id, loses, assume }) => {
    const level = Object.hasOwn(recorded, id) ? recorded[id] : assume;
    return { id, level: level ?? null, lose: loses[level ?? -1] ?? 0 };
  });
}

function writeSize(
  sheet: Worksheet,
  price: SizePrice,
  recorded: Reading | undefined,
  shift: Length | undefined = 0,
): SizeSheet {
  const lose = loseSize(sheet, price, recorded, shift);
  if (recorded?.kind !== 'value') {
    return { reading: null, used: null, deviation: null, band: recorded?.kind ?? 'unread', lose };
  }
  const deviation = findDeviation(sheet, price, recorded.ticks, shift);
  const step = findStep(sheet, price, deviation);
  const beyond = sheet.steps.edges[step] === Number.POSITIVE_INFINITY;
  return {
    reading: recorded.ticks,
    used: price.target + deviation,
    deviation,
    band: beyond ? 'beyond' : step - (deviation < 0 ? price.under : price.over),
    lose,
  };
}

function writeSizes(
  sheet: Worksheet,
  { prices }: PricedLine,
  { sizes }: Piece,
  shift: Shift,
  swapped: boolean,
): PieceSheet['sizes'] {
  const { thickness, width, length } = sizes;
  return {
    thickness: writeSize(sheet, prices.thickness, swapped ? width : thickness, shift.thickness),
    width: writeSize(sheet, prices.width, swapped ? thickness : width, shift.width),
    length: writeSize(sheet, prices.length, length, shift.length),
  };
}

export function writePiece(
  sheet: Worksheet,
  priced: PricedLine,
  mark: PieceMark,
  ordinal: number,
  adjust: Attempt['adjust'],
): PieceSheet {
  const { line, checks } = priced;
  const { piece, gross, swapped, uncapped, lose } = mark;
  const present = piece?.state === 'present' ? piece : null;
  return {
    lineId: line.id,
    ordinal,
    state: piece?.state ?? 'unread',
    gross,
    swapped,
    sizes: present && writeSizes(sheet, priced, present, findShift(adjust, line.id), swapped),
    checks: present ? writeChecks(checks, present.checks) : [],
    uncapped,
    lose,
  };
}

function nameUnread({ state, sizes, checks }: PieceSheet): string[] {
  if (state === 'unread') return ['piece'];
  if (state === 'held') return ['held'];
  return [
    ...AXES.filter((axis) => sizes?.[axis].band === 'unread'),
    ...checks.filter(({ level }) => level === null).map(({ id }) => id),
  ];
}

/** What is still to be read, in cut-list order, then ordinal, axes, checks; the work checks last. */
export function listUnread(pieces: readonly PieceSheet[], work: readonly CheckSheet[]): Unread[] {
  return [
    ...pieces.flatMap((piece) =>
      nameUnread(piece).map((what) => ({ lineId: piece.lineId, ordinal: piece.ordinal, what })),
    ),
    ...work.filter(({ level }) => level === null).map(({ id }) => ({ lineId: '', ordinal: 0, what: id })),
  ];
}
