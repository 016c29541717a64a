import type { Length } from '@/lib/length';
import { AXES, type Axis, type Line } from '@/lib/scoring';
import type { CutList, CutListLine } from '@/lib/scoring/rubric-form';
import { fitsInStrips, isLikeWood, woodOf, woodOfAll } from './propose-variants-fit';
import { alike, type ReachedLine } from './propose-variants-lent';
import type { OtherCutList, SizeGroup, Stop } from './propose-variants-types';
import type { Task } from './task';

/** One way to move the sizes that keeps the rule by itself. */
export interface Candidate {
  lines: ReachedLine[];
  /** How far the wood is from the original's, then how much the sizes move in all. */
  cost: [wood: bigint, moved: Length];
}

/** Bounds on the search, in lines compared and not in time, so that the same question always has the same answer. */
const MOST_WORK = 1_000_000;
const MOST_FOUND = 1_500;

/** The cut list with the lines' sizes as they are now. */
export function cutListOf(lines: readonly Line[]): CutList {
  return { lines: lines.map(({ id, label, quantity, target }) => ({ id, label, quantity, target })) };
}

/** Lines with another cut list's sizes; those that it does not have are left out. */
function linesWith(priced: readonly ReachedLine[], { lines }: CutList): ReachedLine[] {
  const targets = new Map(lines.map(({ id, target }) => [id, target]));
  return priced.flatMap((line) => {
    const target = targets.get(line.id);
    return target ? [{ ...line, target }] : [];
  });
}

/** Where the search was refused when it had come furthest, and how often by which line. */
class Refusals {
  private depth = -1;
  private counts = new Map<string, { stop: Stop; times: number }>();

  note(depth: number, stop: Stop): void {
    if (depth < this.depth) return;
    if (depth > this.depth) this.counts.clear();
    this.depth = depth;
    const key = `${stop.line} ${stop.why}`;
    const known = this.counts.get(key);
    if (known) known.times += 1;
    else this.counts.set(key, { stop, times: 1 });
  }

  most(): Stop | null {
    const [first] = [...this.counts.values()].sort((a, b) => b.times - a.times);
    return first?.stop ?? null;
  }
}

interface Search {
  task: Task;
  priced: readonly ReachedLine[];
  groups: readonly SizeGroup[];
  others: readonly OtherCutList[];
}

/** Every way to move the groups that keeps the rule towards the original and the other lists, cheapest first. */
export function findCandidates(search: Search): { candidates: Candidate[]; stop: Stop | null } {
  const { task, priced, groups, others } = search;
  const kerf = task.kerf ?? 0;
  const original = woodOfAll(task.cutList, kerf);
  const refusals = new Refusals();
  const taken = others.map(({ name, cutList }) => ({ name, lines: linesWith(priced, cutList) }));
  const heaviest = heaviestLine(priced, kerf);
  const found: Candidate[] = [];
  const moves: Length[] = [];
  const { completed, placeOf } = lookUp(groups);
  const perLine = taken.reduce((sum, { lines }) => sum + lines.length, 1);
  let work = 0;

  function place(depth: number): void {
    if (work >= MOST_WORK || found.length >= MOST_FOUND) return;
    const group = groups[depth];
    if (!group) {
      finish();
      return;
    }
    for (const move of group.moves) {
      work += 1;
      moves[depth] = move;
      const stop = refuse(depth, group);
      if (stop) refusals.note(depth, stop);
      else place(depth + 1);
    }
    moves.length = depth;
  }

  function refuse(depth: number, group: SizeGroup): Stop | null {
    const larger = groups[depth - 1];
    const [first] = group.sizes;
    if (larger && first && larger.value + (moves[depth - 1] ?? 0) <= group.value + (moves[depth] ?? 0)) {
      return { line: first.line, why: 'order' };
    }
    for (const index of completed[depth] ?? []) {
      work += perLine;
      const line = movedLine(index);
      const other = line && taken.flatMap((list) => likeIn(line, list))[0];
      if (other) return { line: index, why: 'alike', as: other };
    }
    return null;
  }

  function movedLine(index: number): ReachedLine | undefined {
    const line = priced[index];
    if (!line) return undefined;
    const at = (axis: Axis) => line.target[axis] + (moves[placeOf.get(line.target[axis]) ?? -1] ?? 0);
    const target = { thickness: at('thickness'), width: at('width'), length: at('length') };
    return { ...line, target };
  }

  function finish(): void {
    work += perLine;
    const lines = priced.flatMap((_, index) => movedLine(index) ?? []);
    const wood = woodOfAll({ lines }, kerf);
    if (!isLikeWood(wood, original)) {
      refusals.note(groups.length, { line: heaviest, why: 'wood' });
    } else if (!fits(lines)) {
      refusals.note(groups.length, { line: heaviest, why: 'blank' });
    } else {
      const moved = moves.reduce((sum, move) => sum + Math.abs(move), 0);
      found.push({ lines, cost: [wood > original ? wood - original : original - wood, moved] });
    }
  }

  /** Where the original does not plainly fit, nothing has become larger, so the same cuts yield it. */
  function fits(lines: readonly CutListLine[]): boolean {
    return fitsInStrips(lines, task) || moves.every((move) => move <= 0);
  }

  place(0);
  return { candidates: found.sort(byCost), stop: found.length > 0 ? null : refusals.most() };
}

function byCost({ cost: a }: Candidate, { cost: b }: Candidate): number {
  if (a[1] !== b[1]) return a[1] - b[1];
  return a[0] < b[0] ? -1 : a[0] > b[0] ? 1 : 0;
}

/** Where each size's group stands, and the lines whose last size is settled with each group. */
function lookUp(groups: readonly SizeGroup[]) {
  const placeOf = new Map(groups.map(({ value }, place) => [value, place]));
  const lastOf = new Map<number, number>();
  for (const [place, { sizes }] of groups.entries()) for (const { line } of sizes) lastOf.set(line, place);
  const completed: number[][] = groups.map(() => []);
  for (const [line, place] of [...lastOf].sort(([a], [b]) => a - b)) completed[place]?.push(line);
  return { completed, placeOf };
}

function likeIn(line: ReachedLine, { name, lines }: { name: string; lines: readonly ReachedLine[] }) {
  const like = lines.find((other) => alike(line, other));
  return like ? [{ label: like.label, of: name }] : [];
}

function heaviestLine(lines: readonly Line[], kerf: Length): number {
  const wood = lines.map((line) => woodOf(line, kerf));
  return wood.reduce((best, each, index) => (each > (wood[best] ?? 0n) ? index : best), 0);
}

/** A line that no size of can move, which therefore cannot be told from the original's. */
export function lineThatStays(lines: readonly Line[], groups: readonly SizeGroup[]): Stop | null {
  const index = lines.findIndex((line) =>
    AXES.every((axis) => groups.find(({ value }) => value === line.target[axis])?.moves.length === 1),
  );
  return index < 0 ? null : { line: index, why: 'stays' };
}
