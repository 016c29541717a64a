import {
  AXES,
  type Axis,
  type PieceSheet,
  type Points,
  type Rubric,
  type ScoreSheet,
  type SizeSheet,
} from '@/lib/scoring';

/** One cause of lost points. `ofTotal` is the same loss on the scale of the total, in hundredths. */
export interface LossRow {
  kind: 'size' | 'check' | 'missing' | 'held' | 'gross' | 'capped' | 'set' | 'work';
  lineId: string;
  ordinal: number;
  /** The axis or check; '' for what concerns the whole piece. */
  what: string;
  size: SizeSheet | null;
  points: Points;
  ofTotal: Points;
}

export interface ScoreExplanation {
  rows: LossRow[];
  lost: { points: Points; ofTotal: Points };
  kept: { points: Points; ofTotal: Points };
  possible: Points;
  total: Points;
  /** Given back because the raw score never falls below the floor; 0 when the floor is not reached. */
  floorGives: Points;
  floorGivesOfTotal: Points;
  bonus: Points;
  /** What an earlier version gave more, which a move that lets nobody drop has kept; on the scale of the total. */
  held: Points;
  /** What lateness, the ceiling and rounding together add or take, on the scale of the total. */
  rest: Points;
  score: Points | null;
}

type BareRow = Omit<LossRow, 'ofTotal'>;

/**
 * Where every lost point of a score sheet went. The rows add up in both scales: `lost` is the sum of the rows,
 * `kept` is the whole less `lost` plus what the floor gives, and kept + bonus + held + rest is the score: the sheet's own
 * and what is held. Shares of the total are hundredths, each
 * rounded down and the missing hundredths given to the largest remainders, first rows first. Pure; never fails.
 */
export function explainScore(
  rubric: Rubric,
  sheet: ScoreSheet,
  bonus: Points,
  held: Points = 0,
): ScoreExplanation {
  const bare = [...sheet.pieces.flatMap((piece) => pieceRows(rubric, piece)), ...workRows(sheet)];
  const { possible, total, raw, lost } = sheet;
  const scale = (points: Points) =>
    possible === 0 ? 0 : Math.floor((2 * points * total + possible) / (2 * possible));
  const keptOfTotal = scale(raw);
  const floorGives = raw - (possible - lost);
  const lostOfTotal = total - scale(possible - lost);
  const own = sheet.score ?? sheet.provisional;
  return {
    rows: shareOut(bare, lostOfTotal, possible, total),
    lost: { points: lost, ofTotal: lostOfTotal },
    kept: { points: raw, ofTotal: keptOfTotal },
    possible,
    total,
    floorGives,
    floorGivesOfTotal: keptOfTotal - (total - lostOfTotal),
    bonus,
    held: own === null ? 0 : held,
    rest: own === null ? 0 : own - keptOfTotal - bonus,
    score: own === null ? null : own + held,
  };
}

function pieceRows(rubric: Rubric, piece: PieceSheet): BareRow[] {
  const of = (
    kind: LossRow['kind'],
    what: string,
    points: Points,
    size: SizeSheet | null = null,
  ): BareRow => ({
    kind,
    lineId: piece.lineId,
    ordinal: piece.ordinal,
    what,
    size,
    points,
  });
  if (piece.state === 'missing' || piece.state === 'held') {
    return piece.lose > 0 ? [of(piece.state, '', piece.lose)] : [];
  }
  if (piece.state !== 'present') return [];
  const rows = [...sizeRows(piece, of), ...checkRows(piece, of)];
  const difference = piece.lose - piece.uncapped;
  if (difference === 0) return rows;
  const worth = rubric.lines.find((line) => line.id === piece.lineId)?.worth ?? 0;
  if (piece.gross) return [...rows, of('gross', '', difference)];
  const ownLoss = Math.min(piece.uncapped, worth);
  if (ownLoss !== piece.uncapped) rows.push(of('capped', '', ownLoss - piece.uncapped));
  if (piece.lose !== ownLoss) rows.push(of('set', '', piece.lose - ownLoss));
  return rows;
}

type RowOf = (kind: LossRow['kind'], what: string, points: Points, size?: SizeSheet | null) => BareRow;

function sizeRows({ sizes }: PieceSheet, of: RowOf): BareRow[] {
  if (!sizes) return [];
  return AXES.filter((axis: Axis) => sizes[axis].lose > 0).map((axis) =>
    of('size', axis, sizes[axis].lose, sizes[axis]),
  );
}

function checkRows({ checks }: PieceSheet, of: RowOf): BareRow[] {
  return checks.filter((check) => check.lose > 0).map((check) => of('check', check.id, check.lose));
}

function workRows({ work }: ScoreSheet): BareRow[] {
  return work
    .filter((check) => check.lose > 0)
    .map((check) => ({
      kind: 'work',
      lineId: '',
      ordinal: 0,
      what: check.id,
      size: null,
      points: check.lose,
    }));
}

function shareOut(rows: BareRow[], whole: Points, possible: Points, total: Points): LossRow[] {
  if (possible === 0) return rows.map((row) => ({ ...row, ofTotal: 0 }));
  const shares = rows.map((row) => Math.floor((row.points * total) / possible));
  const remainders = rows.map((row, index) => row.points * total - (shares[index] ?? 0) * possible);
  const order = rows
    .map((_, index) => index)
    .sort((a, b) => (remainders[b] ?? 0) - (remainders[a] ?? 0) || a - b);
  const missing = whole - shares.reduce((sum, share) => sum + share, 0);
  for (const index of order.slice(0, Math.max(0, missing))) shares[index] = (shares[index] ?? 0) + 1;
  return rows.map((row, index) => ({ ...row, ofTotal: shares[index] ?? 0 }));
}
