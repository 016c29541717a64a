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

/** A check with the price of each level; `assumed` is the price of the level `assume`. */
export interface PricedCheck {
  id: string;
  loses: readonly Points[];
  assume: number | null;
  assumed: Points | null;
}

/** A list of checks, with what it comes to where nothing is recorded. */
export interface PricedChecks {
  list: readonly PricedCheck[];
  byId: ReadonlyMap<string, PricedCheck>;
  lose: Points;
  unread: number;
}

/** What one place of a line came to; `piece` is null where none is listed. */
export interface PieceMark {
  piece: Piece | null;
  unread: number;
  gross: boolean;
  swapped: boolean;
  uncapped: Points;
  lose: Points;
}

export interface PricedLine {
  line: Line;
  prices: Record<Axis, SizePrice>;
  checks: PricedChecks;
  marks: PieceMark[];
}

/** A rubric laid out for marking one attempt after another. It belongs to one call and is overwritten. */
export interface Worksheet {
  rubric: Rubric;
  steps: Steps;
  /** Further off than this is gross; infinite where the rubric sets no limit. */
  grossEdge: number;
  lines: PricedLine[];
  lineOf: ReadonlyMap<string, PricedLine>;
  workChecks: PricedChecks;
}

function priceChecks(checks: readonly Check[]): PricedChecks {
  const list = checks.map(({ id, levels, assume }): PricedCheck => {
    const loses = levels.map(({ lose }) => lose);
    return { id, loses, assume, assumed: assume === null ? null : (loses[assume] ?? null) };
  });
  return {
    list,
    byId: new Map(list.map((check) => [check.id, check])),
    lose: list.reduce((sum, { assumed }) => sum + (assumed ?? 0), 0),
    unread: list.filter(({ assumed }) => assumed === null).length,
  };
}

function startMark(): PieceMark {
  return { piece: null, unread: 0, gross: false, swapped: false, uncapped: 0, lose: 0 };
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

function layOutLine(line: Line, steps: StepList): PricedLine {
  const { target, sizes } = line;
  return {
    line,
    prices: {
      thickness: steps.addSize(target.thickness, sizes.thickness),
      width: steps.addSize(target.width, sizes.width),
      length: steps.addSize(target.length, sizes.length),
    },
    checks: priceChecks(line.checks),
    marks: Array.from({ length: line.quantity }, startMark),
  };
}

export function layOutWorksheet(rubric: Rubric): Worksheet {
  const steps = new StepList(rubric.margin);
  const lines = rubric.lines.map((line) => layOutLine(line, steps));
  return {
    rubric,
    steps: steps.finish(),
    grossEdge: rubric.grossLimit === null ? Number.POSITIVE_INFINITY : rubric.grossLimit + rubric.margin,
    lines,
    lineOf: new Map(lines.map((priced) => [priced.line.id, priced])),
    workChecks: priceChecks(rubric.workChecks),
  };
}
