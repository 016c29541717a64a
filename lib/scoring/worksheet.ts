import type { Length } from '@/lib/length';
import type { Axis, Check, Line, Piece, Points, Rubric, SizeRule } from './types';

/** One dimension of a line: its target, and where its steps of over and under begin. */
export interface SizePrice {
  target: Length;
  over: number;
  under: number;
  spoiled: Points;
}

/** Every step of every dimension in a row: the furthest distance, margin included, and what it loses. */
export interface Steps {
  edges: Float64Array;
  loses: Float64Array;
}

/** What one dimension of one piece came to. `step` counts only for a value. */
export interface SizeMark {
  kind: 'value' | 'gauged' | 'spoiled' | 'excused' | 'unread';
  reading: Length;
  deviation: Length;
  step: number;
  gross: boolean;
  lose: Points;
}

/** Checks with their prices; `levels` is written for each attempt, -1 where nobody knows. */
export interface CheckList {
  checks: readonly { id: string; loses: readonly Points[]; assume: number }[];
  places: ReadonlyMap<string, number>;
  levels: Int8Array;
  lose: Points;
  unread: number;
}

export interface PieceMark {
  piece: Piece | null;
  sizes: Record<Axis, SizeMark>;
  /** Where thickness and width are tried the other way round. */
  spare: { thickness: SizeMark; width: SizeMark };
  checks: CheckList;
  unread: number;
  gross: boolean;
  swapped: boolean;
  uncapped: Points;
  lose: Points;
}

export interface LineMarks {
  line: Line;
  prices: Record<Axis, SizePrice>;
  pieces: PieceMark[];
}

/** A rubric laid out for marking one attempt after another. It belongs to one call and is overwritten. */
export interface Worksheet {
  rubric: Rubric;
  steps: Steps;
  grossEdge: number;
  lines: LineMarks[];
  lineOf: ReadonlyMap<string, LineMarks>;
  work: CheckList;
}

const UNASSUMED = -1;

function startChecks(checks: readonly Check[]): CheckList {
  return {
    checks: checks.map(({ id, levels, assume }) => ({
      id,
      loses: levels.map(({ lose }) => lose),
      assume: assume ?? UNASSUMED,
    })),
    places: new Map(checks.map(({ id }, place) => [id, place])),
    levels: new Int8Array(checks.length),
    lose: 0,
    unread: 0,
  };
}

function startSize(): SizeMark {
  return { kind: 'unread', reading: 0, deviation: 0, step: 0, gross: false, lose: 0 };
}

function startPiece(line: Line): PieceMark {
  return {
    piece: null,
    sizes: { thickness: startSize(), width: startSize(), length: startSize() },
    spare: { thickness: startSize(), width: startSize() },
    checks: startChecks(line.checks),
    unread: 0,
    gross: false,
    swapped: false,
    uncapped: 0,
    lose: 0,
  };
}

/** Gathers the steps of one rubric. The last step of a side has no edge: it is everything beyond. */
class StepList {
  private readonly edges: number[] = [];
  private readonly loses: number[] = [];

  constructor(private readonly margin: Length) {}

  addSide(bands: SizeRule['over'], beyond: Points, cap: Points): number {
    const first = this.edges.length;
    this.edges.push(...bands.map(({ within }) => within + this.margin), Number.POSITIVE_INFINITY);
    this.loses.push(...[...bands.map(({ lose }) => lose), beyond].map((lose) => Math.min(lose, cap)));
    return first;
  }

  addSize(target: Length, rule: SizeRule): SizePrice {
    const cap = rule.cap ?? Number.POSITIVE_INFINITY;
    return {
      target,
      over: this.addSide(rule.over, rule.beyondOver, cap),
      under: this.addSide(rule.under, rule.beyondUnder, cap),
      spoiled: Math.min(Math.max(rule.beyondOver, rule.beyondUnder), cap),
    };
  }

  finish(): Steps {
    return { edges: Float64Array.from(this.edges), loses: Float64Array.from(this.loses) };
  }
}

export function layOutWorksheet(rubric: Rubric): Worksheet {
  const steps = new StepList(rubric.margin);
  const lines = rubric.lines.map((line): LineMarks => {
    const { target, sizes } = line;
    return {
      line,
      prices: {
        thickness: steps.addSize(target.thickness, sizes.thickness),
        width: steps.addSize(target.width, sizes.width),
        length: steps.addSize(target.length, sizes.length),
      },
      pieces: Array.from({ length: line.quantity }, () => startPiece(line)),
    };
  });
  return {
    rubric,
    steps: steps.finish(),
    grossEdge: rubric.grossLimit === null ? Number.POSITIVE_INFINITY : rubric.grossLimit + rubric.margin,
    lines,
    lineOf: new Map(lines.map((marks) => [marks.line.id, marks])),
    work: startChecks(rubric.workChecks),
  };
}
