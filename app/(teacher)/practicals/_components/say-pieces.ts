/** "4 lines, 7 pieces" */
export function sayPieces(lines: number, pieces: number): string {
  const count = (of: number, one: string) => `${of} ${one}${of === 1 ? '' : 's'}`;
  return `${count(lines, 'line')}, ${count(pieces, 'piece')}`;
}
