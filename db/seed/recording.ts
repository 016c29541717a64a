import { formatLength, type Length, TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';
import { AXES, type Axis, type Rubric } from '@/lib/scoring';
import type { Cell, CellValue, Side } from '@/lib/sync/cells';
import type { Random } from './random';
import { type MadePiece, readSize, stepOf } from './wood';

export interface SeedEvent {
  id: string;
  attemptId: string;
  side: Side;
  cell: Cell;
  value: CellValue;
  typed: string | null;
  unit: 'in' | 'mm' | null;
  instrument: 'rule' | 'caliper' | 'gauge' | 'keyed' | null;
  supersedes: string[];
  deviceId: string;
  sequence: number;
  capturedAt: Date;
  authorId: string;
}

/** A device that records in order; its clock moves on a few seconds with every reading. */
export class Recorder {
  private sequence = 0;

  constructor(
    private readonly random: Random,
    readonly deviceId: string,
    readonly authorId: string,
    private readonly side: Side,
    private now: Date,
  ) {}

  record(
    attemptId: string,
    cell: Cell,
    value: CellValue,
    as: Pick<SeedEvent, 'typed' | 'unit' | 'instrument'> = { typed: null, unit: null, instrument: null },
    supersedes: string[] = [],
  ): SeedEvent {
    this.sequence += 1;
    this.now = new Date(this.now.getTime() + this.random.whole(1500, 4200));
    const { side, deviceId, authorId, sequence, now } = this;
    return {
      id: this.random.uuid(),
      attemptId,
      side,
      cell,
      value,
      ...as,
      supersedes,
      deviceId,
      sequence,
      capturedAt: now,
      authorId,
    };
  }
}

export interface Reader {
  /** Added to every reading: a zero error of the instrument, or a grader who presses too hard. */
  bias: Length;
  /** The instrument: a rule is read to its graduation, a caliper to a thousandth of an inch or 0.01 mm. */
  instrument: 'rule' | 'caliper';
  /** Passes by gauge block what is plainly inside the free band. */
  gauges: boolean;
  /** The caliper stands on millimetres though the rubric is in inches. */
  inMillimetres?: boolean;
}

/** Everything one person records of one student's pieces. */
export function recordPieces(
  random: Random,
  recorder: Recorder,
  attemptId: string,
  rubric: Rubric,
  pieces: MadePiece[],
  reader: Reader,
): SeedEvent[] {
  return pieces.flatMap((piece) => {
    const cell = (what: string): Cell => ({ lineId: piece.line.id, ordinal: piece.ordinal, what });
    if (!piece.present)
      return [recorder.record(attemptId, cell('piece'), { kind: 'state', state: 'missing' })];
    const sizes = AXES.map((axis) => recordSize(random, recorder, attemptId, rubric, piece, axis, reader));
    const checks = Object.entries(piece.checks).map(([id, level]) =>
      recorder.record(attemptId, cell(id), { kind: 'level', level }),
    );
    return [...sizes, ...checks];
  });
}

function recordSize(
  random: Random,
  recorder: Recorder,
  attemptId: string,
  rubric: Rubric,
  piece: MadePiece,
  axis: Axis,
  reader: Reader,
): SeedEvent {
  const cell: Cell = { lineId: piece.line.id, ordinal: piece.ordinal, what: axis };
  const size = piece.sizes[axis] + reader.bias;
  const deviation = size - piece.line.target[axis];
  const free = (deviation < 0 ? piece.line.sizes[axis].under : piece.line.sizes[axis].over)[0]?.within ?? 0;
  if (reader.gauges && Math.abs(deviation) < free * 0.8 && random.chance(0.8)) {
    return recorder.record(
      attemptId,
      cell,
      { kind: 'gauged' },
      { typed: null, unit: null, instrument: 'gauge' },
    );
  }
  const { ticks, typed, unit } = writeReading(size, rubric, reader);
  return recorder.record(
    attemptId,
    cell,
    { kind: 'value', ticks },
    { typed, unit, instrument: reader.instrument },
  );
}

function writeReading(
  size: Length,
  rubric: Rubric,
  reader: Reader,
): { ticks: Length; typed: string; unit: 'in' | 'mm' } {
  if (reader.inMillimetres || (rubric.unit === 'mm' && reader.instrument === 'caliper')) {
    const ticks = readSize(size, TICKS_PER_MM / 100);
    return { ticks, typed: formatLength(ticks, { unit: 'mm', decimals: 2 }), unit: 'mm' };
  }
  if (rubric.unit === 'mm') {
    const ticks = readSize(size, stepOf(rubric));
    return { ticks, typed: formatLength(ticks, { unit: 'mm', decimals: 1 }), unit: 'mm' };
  }
  if (reader.instrument === 'caliper') {
    const ticks = readSize(size, TICKS_PER_INCH / 1000);
    return { ticks, typed: formatLength(ticks, { unit: 'in', decimals: 3 }), unit: 'in' };
  }
  const graduation = TICKS_PER_INCH / (finerThan32(rubric) ? 64 : 32);
  const ticks = readSize(size, graduation);
  return { ticks, typed: formatLength(ticks, { unit: 'in', denominator: 64 }), unit: 'in' };
}

function finerThan32(rubric: Rubric): boolean {
  return rubric.lines.some((line) => (line.sizes.length.over[0]?.within ?? 0) < TICKS_PER_INCH / 32);
}

/** The checks of the whole work that nobody may assume, and the mark that this student is done. */
export function recordFinish(
  random: Random,
  recorder: Recorder,
  attemptId: string,
  rubric: Rubric,
): SeedEvent[] {
  const cell = (what: string): Cell => ({ lineId: '', ordinal: 0, what });
  const checks = rubric.workChecks.filter((check) => check.assume === null);
  return [
    ...checks.map((check) => {
      const level = random.chance(0.1) ? check.levels.length - 1 : 0;
      return recorder.record(attemptId, cell(check.id), { kind: 'level', level });
    }),
    recorder.record(attemptId, cell('@finish'), { kind: 'finish', done: true }),
  ];
}
