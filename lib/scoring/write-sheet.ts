import { AXES, type CheckSheet, type PieceSheet, type SizeSheet, type Unread } from './types';
import type { CheckList, LineMarks, PieceMark, SizeMark, SizePrice, Worksheet } from './worksheet';

export function writeChecks(list: CheckList): CheckSheet[] {
  return list.checks.map(({ id, loses }, place) => {
    const level = list.levels[place] ?? -1;
    const lose = loses[level];
    return lose === undefined ? { id, level: null, lose: 0 } : { id, level, lose };
  });
}

function writeSize({ edges }: Worksheet['steps'], price: SizePrice, mark: SizeMark): SizeSheet {
  const { kind, lose } = mark;
  if (kind !== 'value') return { reading: null, used: null, deviation: null, band: kind, lose };
  const { reading, deviation, step } = mark;
  const first = deviation < 0 ? price.under : price.over;
  const band = edges[step] === Number.POSITIVE_INFINITY ? 'beyond' : step - first;
  return { reading, used: price.target + deviation, deviation, band, lose };
}

export function writePiece(
  sheet: Worksheet,
  { line, prices }: LineMarks,
  mark: PieceMark,
  place: number,
): PieceSheet {
  const { sizes, gross, swapped, uncapped, lose } = mark;
  const present = mark.piece?.state === 'present';
  return {
    lineId: line.id,
    ordinal: place + 1,
    state: mark.piece?.state ?? 'unread',
    gross,
    swapped,
    sizes: present
      ? {
          thickness: writeSize(sheet.steps, prices.thickness, sizes.thickness),
          width: writeSize(sheet.steps, prices.width, sizes.width),
          length: writeSize(sheet.steps, prices.length, sizes.length),
        }
      : null,
    checks: present ? writeChecks(mark.checks) : [],
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
