/** A cost of two ranks: `minor` decides only between equals in `major`. Sums stay whole and below 2^53. */
export interface Cost {
  major: number;
  minor: number;
}

interface Solution {
  /** The row that holds each column, or −1. */
  rowOf: Int32Array;
  columnOf: Int32Array;
  /** Whether row and column may stand together in an assignment of least cost. */
  tight(row: number, column: number): boolean;
  /** Whether every assignment of least cost fills this column. */
  mustFill(column: number): boolean;
}

/**
 * Gives each row a column of its own for the least total cost; of equal assignments, the one whose columns, read in
 * the order of the rows, come first. Exact: shortest augmenting paths (Kuhn 1955, Munkres 1957), then exchanges along
 * edges without slack. There are at least as many columns as rows; a `null` cost is a pair that must not be.
 *
 * @returns the column of each row. @throws RangeError when some row has no column left that it may take.
 * @example assignLeast(2, 2, (row, column) => ({ major: row === column ? 2 : 1, minor: 0 })) // [1, 0]
 */
export function assignLeast(
  rows: number,
  columns: number,
  costOf: (row: number, column: number) => Cost | null,
): number[] {
  if (columns < rows) throw new RangeError('there are fewer columns than rows');
  const solution = solve(rows, columns, costOf);
  for (let row = 0; row < rows; row++) takeFirst(solution, row, rows, columns);
  return [...solution.columnOf];
}

function solve(
  rows: number,
  columns: number,
  costOf: (row: number, column: number) => Cost | null,
): Solution {
  const costs = tabulate(rows, columns, costOf);
  const u = makePairs(rows);
  const v = makePairs(columns);
  const rowOf = new Int32Array(columns).fill(-1);
  for (let row = 0; row < rows; row++) augment(row, columns, costs, u, v, rowOf);
  const columnOf = new Int32Array(rows);
  rowOf.forEach((row, column) => {
    if (row >= 0) columnOf[row] = column;
  });
  return {
    rowOf,
    columnOf,
    tight: (row, column) => {
      const at = row * columns + column;
      return (
        get(costs.major, at) === get(u.major, row) + get(v.major, column) &&
        get(costs.minor, at) === get(u.minor, row) + get(v.minor, column)
      );
    },
    mustFill: (column) => get(v.major, column) !== 0 || get(v.minor, column) !== 0,
  };
}

interface Pairs {
  major: Float64Array;
  minor: Float64Array;
}

function makePairs(length: number): Pairs {
  return { major: new Float64Array(length), minor: new Float64Array(length) };
}

function get(values: Float64Array | Int32Array, at: number): number {
  return values[at] ?? 0;
}

function tabulate(
  rows: number,
  columns: number,
  costOf: (row: number, column: number) => Cost | null,
): Pairs {
  const costs = makePairs(rows * columns);
  for (let row = 0; row < rows; row++) {
    for (let column = 0; column < columns; column++) {
      const cost = costOf(row, column);
      costs.major[row * columns + column] = cost?.major ?? Number.POSITIVE_INFINITY;
      costs.minor[row * columns + column] = cost?.minor ?? 0;
    }
  }
  return costs;
}

/** Finds the row a column by the shortest path of exchanges, and keeps all reduced costs at or above 0. */
function augment(row: number, columns: number, costs: Pairs, u: Pairs, v: Pairs, rowOf: Int32Array): void {
  const least = makePairs(columns);
  least.major.fill(Number.POSITIVE_INFINITY);
  const from = new Int32Array(columns).fill(-1);
  const done = new Uint8Array(columns);
  let at = -1;
  let current = row;
  do {
    relax(current, at, columns, costs, u, v, least, from, done);
    const next = nearest(columns, least, done);
    shift(row, next, columns, u, v, least, done, rowOf);
    done[next] = 1;
    at = next;
    current = get(rowOf, next);
  } while (current >= 0);
  while (at >= 0) {
    const before = get(from, at);
    rowOf[at] = before >= 0 ? get(rowOf, before) : row;
    at = before;
  }
}

function relax(
  row: number,
  via: number,
  columns: number,
  costs: Pairs,
  u: Pairs,
  v: Pairs,
  least: Pairs,
  from: Int32Array,
  done: Uint8Array,
): void {
  for (let column = 0; column < columns; column++) {
    if (done[column]) continue;
    const at = row * columns + column;
    const major = get(costs.major, at) - get(u.major, row) - get(v.major, column);
    const minor = get(costs.minor, at) - get(u.minor, row) - get(v.minor, column);
    if (isLess(major, minor, get(least.major, column), get(least.minor, column))) {
      least.major[column] = major;
      least.minor[column] = minor;
      from[column] = via;
    }
  }
}

function isLess(major: number, minor: number, thanMajor: number, thanMinor: number): boolean {
  return major < thanMajor || (major === thanMajor && minor < thanMinor);
}

function nearest(columns: number, least: Pairs, done: Uint8Array): number {
  let best = -1;
  for (let column = 0; column < columns; column++) {
    if (done[column] || get(least.major, column) === Number.POSITIVE_INFINITY) continue;
    const [major, minor] = [get(least.major, column), get(least.minor, column)];
    if (best < 0 || isLess(major, minor, get(least.major, best), get(least.minor, best))) best = column;
  }
  if (best < 0) throw new RangeError('some row has no column that it may take');
  return best;
}

function shift(
  row: number,
  next: number,
  columns: number,
  u: Pairs,
  v: Pairs,
  least: Pairs,
  done: Uint8Array,
  rowOf: Int32Array,
): void {
  for (const rank of ['major', 'minor'] as const) {
    const by = get(least[rank], next);
    u[rank][row] = get(u[rank], row) + by;
    for (let column = 0; column < columns; column++) {
      if (done[column]) {
        const held = get(rowOf, column);
        u[rank][held] = get(u[rank], held) + by;
        v[rank][column] = get(v[rank], column) - by;
      } else {
        least[rank][column] = get(least[rank], column) - by;
      }
    }
  }
}

/** Moves a row to the first column that some assignment of least cost gives it, earlier rows kept where they are. */
function takeFirst(solution: Solution, row: number, rows: number, columns: number): void {
  const now = get(solution.columnOf, row);
  for (let column = 0; column < now; column++) {
    const holder = get(solution.rowOf, column);
    if ((holder >= 0 && holder < row) || !solution.tight(row, column)) continue;
    if (exchange(solution, row, column, rows, columns)) return;
  }
}

/** Nobody's row: it stands for all columns left empty, and may hold any column that need not be filled. */
const NOBODY = -1;

/**
 * Lets `row` take `wanted`; whoever held it looks for another column, and so on, until one takes the column that
 * `row` leaves. Changes nothing when there is no such chain.
 */
function exchange(solution: Solution, row: number, wanted: number, rows: number, columns: number): boolean {
  const { rowOf, columnOf, tight, mustFill } = solution;
  const left = get(columnOf, row);
  const mayHold = (holder: number, column: number) =>
    holder === NOBODY ? !mustFill(column) : tight(holder, column);
  const from = new Map<number, number>();
  const queue = [wanted];
  for (let head = 0; head < queue.length && !from.has(left); head++) {
    const source = queue[head] ?? wanted;
    const holder = get(rowOf, source);
    for (let column = 0; column < columns; column++) {
      const fixed = get(rowOf, column) >= 0 && get(rowOf, column) < row;
      if (fixed || column === wanted || from.has(column) || !mayHold(holder, column)) continue;
      from.set(column, source);
      queue.push(column);
    }
  }
  if (!from.has(left)) return false;
  for (let column = left; column !== wanted; ) {
    const source = from.get(column) ?? wanted;
    const holder = get(rowOf, source);
    rowOf[column] = holder;
    if (holder >= 0 && holder < rows) columnOf[holder] = column;
    column = source;
  }
  rowOf[wanted] = row;
  columnOf[row] = wanted;
  return true;
}
