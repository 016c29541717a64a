/** Every way to give each row a column, no column more rows than its capacity; each as the columns of the rows. */
export function everyAssignment(rows: number, capacities: readonly number[]): number[][] {
  if (rows === 0) return [[]];
  return capacities.flatMap((capacity, column) => {
    if (capacity === 0) return [];
    const left = capacities.map((each, at) => (at === column ? each - 1 : each));
    return everyAssignment(rows - 1, left).map((columns) => [column, ...columns]);
  });
}
