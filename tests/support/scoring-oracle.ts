import { Fraction } from 'fraction.js';
import type {
  Attempt,
  Axis,
  Check,
  CheckSheet,
  Line,
  Piece,
  PieceSheet,
  Reading,
  Rubric,
  ScoreSheet,
  SizeSheet,
  Unread,
} from '@/lib/scoring';

/**
 * A second reading of the scoring rules, slow and plain: every length and every amount of points is a Fraction,
 * every list is searched from its start, nothing is laid out in advance. It takes only attempts that fit.
 */

const ZERO = new Fraction(0);
const HUNDRED = new Fraction(100);
const AXES: Axis[] = ['thickness', 'width', 'length'];

interface OracleSize {
  reading: Fraction | null;
  used: Fraction | null;
  deviation: Fraction | null;
  band: SizeSheet['band'];
  lose: Fraction;
  gross: boolean;
}

interface OraclePiece {
  line: Line;
  ordinal: number;
  state: PieceSheet['state'];
  swapped: boolean;
  gross: boolean;
  sizes: Record<Axis, OracleSize> | null;
  checks: OracleCheck[];
  uncapped: Fraction;
  lose: Fraction;
}

interface OracleCheck {
  id: string;
  level: number | null;
  lose: Fraction;
}

function smaller(a: Fraction, b: Fraction): Fraction {
  return a.lt(b) ? a : b;
}

function larger(a: Fraction, b: Fraction): Fraction {
  return a.gt(b) ? a : b;
}

function sum(values: Fraction[]): Fraction {
  return values.reduce((total, value) => total.add(value), ZERO);
}

/** To the nearest multiple; of two equally near ones, the one nearer to zero. */
function roundToMultiple(deviation: Fraction, multiple: Fraction): Fraction {
  const below = deviation.div(multiple).floor().mul(multiple);
  const above = below.add(multiple);
  const toBelow = deviation.sub(below);
  const toAbove = above.sub(deviation);
  if (toBelow.equals(toAbove)) return below.abs().lt(above.abs()) ? below : above;
  return toBelow.lt(toAbove) ? below : above;
}

function priceValue(rubric: Rubric, line: Line, axis: Axis, ticks: number, shift: number): OracleSize {
  const rule = line.sizes[axis];
  const reading = new Fraction(ticks);
  const target = new Fraction(line.target[axis]);
  const margin = new Fraction(rubric.margin);
  let deviation = reading.add(new Fraction(shift)).sub(target);
  if (rubric.readTo !== null) deviation = roundToMultiple(deviation, new Fraction(rubric.readTo));
  const off = deviation.abs();
  const bands = deviation.lt(ZERO) ? rule.under : rule.over;
  const beyond = deviation.lt(ZERO) ? rule.beyondUnder : rule.beyondOver;
  const index = bands.findIndex(({ within }) => off.lte(new Fraction(within).add(margin)));
  const price = new Fraction(bands[index]?.lose ?? beyond);
  const grossPast = rubric.grossLimit === null ? null : new Fraction(rubric.grossLimit).add(margin);
  return {
    reading,
    used: target.add(deviation),
    deviation,
    band: index === -1 ? 'beyond' : index,
    lose: rule.cap === null ? price : smaller(price, new Fraction(rule.cap)),
    gross: grossPast?.lt(off) ?? false,
  };
}

function priceSize(
  rubric: Rubric,
  line: Line,
  axis: Axis,
  recorded: Reading | undefined,
  shift: number,
): OracleSize {
  if (recorded?.kind === 'value') return priceValue(rubric, line, axis, recorded.ticks, shift);
  const rule = line.sizes[axis];
  const worst = larger(new Fraction(rule.beyondOver), new Fraction(rule.beyondUnder));
  const spoiled = rule.cap === null ? worst : smaller(worst, new Fraction(rule.cap));
  return {
    reading: null,
    used: null,
    deviation: null,
    band: recorded === undefined ? 'unread' : recorded.kind,
    lose: recorded?.kind === 'spoiled' ? spoiled : ZERO,
    gross: false,
  };
}

function priceChecks(checks: Check[], recorded: Record<string, number>): OracleCheck[] {
  const levels = new Map(Object.entries(recorded));
  return checks.map(({ id, levels: prices, assume }) => {
    const level = levels.get(id) ?? assume;
    return { id, level, lose: level === null ? ZERO : new Fraction(prices[level]?.lose ?? Number.NaN) };
  });
}

/** Steps 1 to 4, 6 and 7 for readings laid on the axes one way. */
function priceArranged(
  rubric: Rubric,
  line: Line,
  readings: Piece['sizes'],
  shifts: Partial<Record<Axis, number>>,
  checks: OracleCheck[],
) {
  const price = (axis: Axis) => priceSize(rubric, line, axis, readings[axis], shifts[axis] ?? 0);
  const sizes = { thickness: price('thickness'), width: price('width'), length: price('length') };
  const gross = AXES.some((axis) => sizes[axis].gross);
  const uncapped = sum([...AXES.map((axis) => sizes[axis].lose), ...checks.map(({ lose }) => lose)]);
  const worth = new Fraction(line.worth);
  return { sizes, gross, uncapped, lose: gross ? worth : smaller(uncapped, worth) };
}

function pricePresent(rubric: Rubric, line: Line, piece: Piece, adjust: Attempt['adjust']): OraclePiece {
  const shifts = new Map(Object.entries(adjust ?? {})).get(line.id) ?? {};
  const checks = priceChecks(line.checks, piece.checks);
  const { thickness, width, length } = piece.sizes;
  const laid = priceArranged(rubric, line, piece.sizes, shifts, checks);
  const common = { line, ordinal: piece.ordinal, state: piece.state, checks };
  if (line.swap && thickness?.kind === 'value' && width?.kind === 'value') {
    const turned = priceArranged(
      rubric,
      line,
      { thickness: width, width: thickness, length },
      shifts,
      checks,
    );
    const order =
      turned.lose.compare(laid.lose) ||
      Number(turned.gross) - Number(laid.gross) ||
      turned.uncapped.compare(laid.uncapped);
    if (order < 0) return { ...common, swapped: true, ...turned };
  }
  return { ...common, swapped: false, ...laid };
}

function pricePiece(rubric: Rubric, line: Line, ordinal: number, attempt: Attempt): OraclePiece {
  const piece = attempt.pieces.find((one) => one.lineId === line.id && one.ordinal === ordinal);
  if (piece?.state === 'present') return pricePresent(rubric, line, piece, attempt.adjust);
  const state = piece?.state ?? 'unread';
  const lose = state === 'missing' || state === 'held' ? new Fraction(line.missing) : ZERO;
  return {
    line,
    ordinal,
    state,
    swapped: false,
    gross: false,
    sizes: null,
    checks: [],
    uncapped: lose,
    lose,
  };
}

function priceLine(rubric: Rubric, line: Line, attempt: Attempt): OraclePiece[] {
  const pieces = Array.from({ length: line.quantity }, (_, at) => pricePiece(rubric, line, at + 1, attempt));
  if (line.set === 'each') return pieces;
  const present = pieces.filter(({ state }) => state === 'present');
  const worst = present.map(({ lose }) => lose).reduce(larger, ZERO);
  return pieces.map((piece) => (piece.state === 'present' ? { ...piece, lose: worst } : piece));
}

function listUnread(pieces: OraclePiece[], work: OracleCheck[]): Unread[] {
  const unread: Unread[] = [];
  for (const { line, ordinal, state, sizes, checks } of pieces) {
    const add = (what: string) => unread.push({ lineId: line.id, ordinal, what });
    if (state === 'unread') add('piece');
    if (state === 'held') add('held');
    for (const axis of AXES) if (sizes?.[axis].band === 'unread') add(axis);
    for (const { id, level } of checks) if (level === null) add(id);
  }
  for (const { id, level } of work) if (level === null) unread.push({ lineId: '', ordinal: 0, what: id });
  return unread;
}

interface OracleTotals {
  possible: Fraction;
  lost: Fraction;
  raw: Fraction;
  total: Fraction;
  provisional: Fraction | null;
}

function settle(rubric: Rubric, attempt: Attempt, pieces: OraclePiece[], work: OracleCheck[]): OracleTotals {
  const counted = pieces.filter(({ state }) => state !== 'excused');
  const worths = sum(counted.map(({ line }) => new Fraction(line.worth)));
  const possible = rubric.basis === 'start' ? new Fraction(rubric.start ?? Number.NaN) : worths;
  const lost = sum([...pieces, ...work].map(({ lose }) => lose));
  const floor = possible.mul(new Fraction(rubric.floor)).div(HUNDRED).ceil();
  const raw = larger(floor, possible.sub(lost));
  const total = rubric.outOf === null ? possible : new Fraction(rubric.outOf);
  if (counted.length === 0 || possible.equals(ZERO)) return { possible, lost, raw, total, provisional: null };

  const limit = total.mul(new Fraction(rubric.ceiling)).div(HUNDRED);
  let score = raw.mul(total).div(possible).add(new Fraction(attempt.bonus));
  if (rubric.late !== null) {
    const { perDay, max } = rubric.late;
    const off = smaller(new Fraction(max), new Fraction(perDay).mul(new Fraction(attempt.daysLate)));
    score = score.mul(HUNDRED.sub(off)).div(HUNDRED);
  }
  score = smaller(score, limit);
  const step = new Fraction(rubric.roundTo);
  let rounded = score.div(step).add(new Fraction(1n, 2n)).floor().mul(step);
  if (rounded.gt(limit)) rounded = limit.div(step).floor().mul(step);
  return { possible, lost, raw, total, provisional: rounded };
}

function toNumber(value: Fraction): number {
  if (value.d !== 1n) throw new Error(`${value.toFraction()} is not whole`);
  return Number(value.s * value.n);
}

function toSizeSheet({ reading, used, deviation, band, lose }: OracleSize): SizeSheet {
  const orNull = (value: Fraction | null) => (value === null ? null : toNumber(value));
  return {
    reading: orNull(reading),
    used: orNull(used),
    deviation: orNull(deviation),
    band,
    lose: toNumber(lose),
  };
}

function toCheckSheet({ id, level, lose }: OracleCheck): CheckSheet {
  return { id, level, lose: toNumber(lose) };
}

function toPieceSheet(piece: OraclePiece): PieceSheet {
  const { line, ordinal, state, gross, swapped, sizes, checks, uncapped, lose } = piece;
  return {
    lineId: line.id,
    ordinal,
    state,
    gross,
    swapped,
    sizes: sizes && {
      thickness: toSizeSheet(sizes.thickness),
      width: toSizeSheet(sizes.width),
      length: toSizeSheet(sizes.length),
    },
    checks: checks.map(toCheckSheet),
    uncapped: toNumber(uncapped),
    lose: toNumber(lose),
  };
}

export function scoreByOracle(rubric: Rubric, attempt: Attempt): ScoreSheet {
  const pieces = rubric.lines.flatMap((line) => priceLine(rubric, line, attempt));
  const work = priceChecks(rubric.workChecks, attempt.work);
  const unread = listUnread(pieces, work);
  const { possible, lost, raw, total, provisional } = settle(rubric, attempt, pieces, work);
  const result = provisional === null ? null : toNumber(provisional);
  return {
    complete: unread.length === 0,
    unread,
    possible: toNumber(possible),
    lost: toNumber(lost),
    raw: toNumber(raw),
    total: toNumber(total),
    provisional: result,
    score: unread.length === 0 ? result : null,
    pieces: pieces.map(toPieceSheet),
    work: work.map(toCheckSheet),
  };
}
