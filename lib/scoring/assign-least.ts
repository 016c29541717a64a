/** A cost of two ranks: `minor` decides only between equals in `major`. Whole, >= 0, with sums below 2^53. */
export interface Cost {
  major: number;
  minor: number;
}

type CostOf = (row: number, column: number) => Cost | null;

interface Ranks {
  major: Float64Array;
  minor: Float64Array;
}

/** Costs, the prices that prove an assignment the least (Kuhn's u and v), and the assignment so far. */
interface Table {
  rows: number;
  columns: number;
  capacities: readonly number[];
  costs: Ranks;
  u: Ranks;
  v: Ranks;
  columnOf: Int32Array;
  used: Int32Array;
}

/**
 * Gives each row a column, no column more rows than its capacity, for the least total cost; of equal assignments, the
 * one whose columns, read in the order of the rows, come first. A `null` cost is a pair that must not be. Exact:
 * shortest augmenting paths (Kuhn 1955; Edmonds and Karp 1972), then exchanges along pairs without slack.
 *
 * @returns the column of each row. @throws RangeError when some row is left without a column that it may take.
 * @example assignLeast(2, [1, 1], (row, column) => ({ major: row === column ? 2 : 1, minor: 0 })) // [1, 0]
 */
export function assignLeast(rows: number, capacities: readonly number[], costOf: CostOf): number[] {
  const table = layOut(rows, capacities, costOf);
  for (let row = 0; row < rows; row++) addRow(table, row);
  for (let row = 0; row < rows; row++) takeFirst(table, row);
  return [...table.columnOf];
}

function layOut(rows: number, capacities: readonly number[], costOf: CostOf): Table {
  const columns = capacities.length;
  const costs = makeRanks(rows * columns);
  for (let at = 0; at < rows * columns; at++) {
    const column = at % columns;
    const cost = costOf((at - column) / columns, column);
    costs.major[at] = cost?.major ?? Number.POSITIVE_INFINITY;
    costs.minor[at] = cost?.minor ?? 0;
  }
  return {
    ...{ rows, columns, capacities, costs },
    u: makeRanks(rows),
    v: makeRanks(columns),
    columnOf: new Int32Array(rows).fill(-1),
    used: new Int32Array(columns),
  };
}

function makeRanks(length: number): Ranks {
  return { major: new Float64Array(length), minor: new Float64Array(length) };
}

/** One reader for each kind of list: a reader of both is several times slower. */
function get(values: Float64Array, at: number): number {
  return values[at] ?? 0;
}

function getIndex(values: Int32Array, at: number): number {
  return values[at] ?? 0;
}

function hasRoom({ used, capacities }: Table, column: number): boolean {
  return getIndex(used, column) < (capacities[column] ?? 0);
}

/** How far each column is from the row that looks for one, and which row would move there. */
interface Search {
  far: Ranks;
  mover: Int32Array;
  done: Int32Array;
}

/** Finds the row a column by the cheapest chain of moves, and keeps every pair's slack at or above 0. */
function addRow(table: Table, row: number): void {
  const { columns, columnOf } = table;
  const search: Search = {
    far: makeRanks(columns),
    mover: new Int32Array(columns).fill(-1),
    done: new Int32Array(columns),
  };
  search.far.major.fill(Number.POSITIVE_INFINITY);
  relax(table, search, row, 0, 0);
  let column = nearest(table, search);
  while (!hasRoom(table, column)) {
    search.done[column] = 1;
    for (let holder = 0; holder < row; holder++) {
      if (getIndex(columnOf, holder) !== column) continue;
      relax(table, search, holder, get(search.far.major, column), get(search.far.minor, column));
    }
    column = nearest(table, search);
  }
  reprice(table, search, row, column);
  table.used[column] = getIndex(table.used, column) + 1;
  for (let free = column; free >= 0; ) {
    const mover = getIndex(search.mover, free);
    const left = getIndex(columnOf, mover);
    columnOf[mover] = free;
    free = left;
  }
}

function relax({ columns, costs, u, v }: Table, search: Search, row: number, major: number, minor: number) {
  const { far, mover, done } = search;
  const baseMajor = major - get(u.major, row);
  const baseMinor = minor - get(u.minor, row);
  for (let column = 0, at = row * columns; column < columns; column++, at++) {
    if (getIndex(done, column) === 1) continue;
    const farMajor = baseMajor + get(costs.major, at) - get(v.major, column);
    if (farMajor > get(far.major, column) || farMajor === Number.POSITIVE_INFINITY) continue;
    const farMinor = baseMinor + get(costs.minor, at) - get(v.minor, column);
    if (farMajor === get(far.major, column) && farMinor >= get(far.minor, column)) continue;
    far.major[column] = farMajor;
    far.minor[column] = farMinor;
    mover[column] = row;
  }
}

/** The nearest column that is not done; of equals one with room, which ends the search. */
function nearest(table: Table, { far, mover, done }: Search): number {
  let best = -1;
  for (let column = 0; column < table.columns; column++) {
    if (getIndex(done, column) === 1 || getIndex(mover, column) < 0) continue;
    if (best < 0 || isNearer(table, far, column, best)) best = column;
  }
  if (best < 0) throw new RangeError('a row is left without a column that it may take');
  return best;
}

function isNearer(table: Table, { major, minor }: Ranks, column: number, than: number): boolean {
  if (get(major, column) !== get(major, than)) return get(major, column) < get(major, than);
  if (get(minor, column) !== get(minor, than)) return get(minor, column) < get(minor, than);
  return hasRoom(table, column) && !hasRoom(table, than);
}

function reprice({ columns, columnOf, u, v }: Table, { far, done }: Search, row: number, last: number) {
  for (const rank of ['major', 'minor'] as const) {
    const end = get(far[rank], last);
    u[rank][row] = end;
    for (let holder = 0; holder < row; holder++) {
      const column = getIndex(columnOf, holder);
      if (getIndex(done, column) === 1) u[rank][holder] = get(u[rank], holder) + end - get(far[rank], column);
    }
    for (let column = 0; column < columns; column++) {
      if (getIndex(done, column) === 1) v[rank][column] = get(v[rank], column) - end + get(far[rank], column);
    }
  }
}

/** Whether row and column may stand together in an assignment of least cost. */
function isTight({ columns, costs, u, v }: Table, row: number, column: number): boolean {
  const at = row * columns + column;
  return (
    get(costs.major, at) === get(u.major, row) + get(v.major, column) &&
    get(costs.minor, at) === get(u.minor, row) + get(v.minor, column)
  );
}

/** Whether every assignment of least cost fills this column. */
function mustFill({ v }: Table, column: number): boolean {
  return get(v.major, column) !== 0 || get(v.minor, column) !== 0;
}

/** Moves a row to the first column that some assignment of least cost gives it, earlier rows kept where they are. */
function takeFirst(table: Table, row: number): void {
  const now = getIndex(table.columnOf, row);
  let wanted = 0;
  while (wanted < now && !isTight(table, row, wanted)) wanted += 1;
  if (wanted === now) return;
  const chains = findChains(table, row, wanted);
  while (wanted < now && !(getIndex(chains.onward, wanted) >= 0 && isTight(table, row, wanted))) wanted += 1;
  if (wanted < now) exchange(table, row, wanted, chains);
}

/** No row: it holds the room that is left in a column, and may hold any column that need not be filled. */
const NOBODY = -1;

interface Chains {
  /** Where the mover of a column goes when somebody takes its place there; −1 where no chain begins. */
  onward: Int32Array;
  mover: Int32Array;
}

/**
 * From every column the chain of moves, by later rows only, whose last takes the place that `row` leaves; no further
 * than to `wanted`, if there is one from there.
 */
function findChains(table: Table, row: number, wanted: number): Chains {
  const { rows, columns, columnOf } = table;
  const left = getIndex(columnOf, row);
  const chains = { onward: new Int32Array(columns).fill(-1), mover: new Int32Array(columns).fill(NOBODY) };
  chains.onward[left] = left;
  const queue = [left];
  const reach = (column: number, mover: number, target: number) => {
    if (getIndex(chains.onward, column) >= 0) return;
    chains.onward[column] = target;
    chains.mover[column] = mover;
    queue.push(column);
  };
  let roomReached = false;
  for (let head = 0; head < queue.length && getIndex(chains.onward, wanted) < 0; head++) {
    const target = queue[head] ?? left;
    for (let holder = row + 1; holder < rows; holder++) {
      if (isTight(table, holder, target)) reach(getIndex(columnOf, holder), holder, target);
    }
    if (roomReached || mustFill(table, target)) continue;
    roomReached = true;
    for (let column = 0; column < columns; column++) {
      if (hasRoom(table, column)) reach(column, NOBODY, target);
    }
  }
  return chains;
}

function exchange({ columnOf, used }: Table, row: number, wanted: number, { onward, mover }: Chains): void {
  const left = getIndex(columnOf, row);
  columnOf[row] = wanted;
  for (let column = wanted; column !== left; ) {
    const target = getIndex(onward, column);
    const moving = getIndex(mover, column);
    if (moving >= 0) columnOf[moving] = target;
    column = target;
  }
  used.fill(0);
  for (const column of columnOf) used[column] = getIndex(used, column) + 1;
}
