/** A move as far as holding depends on it. */
export interface HoldingMove {
  number: number;
  fromVersionId: string;
  holdHarmless: boolean;
}

/**
 * The versions under which nobody's score may be lower, the latest first, for a sitting that stands under
 * `versionId` after these standing moves: those it came from, back to the last move that was made "as is".
 *
 * @example heldVersions('v3', [{ number: 1, fromVersionId: 'v1', holdHarmless: true }]) // ['v1']
 */
export function heldVersions(versionId: string, moves: readonly HoldingMove[]): string[] {
  const held = new Set<string>();
  for (const move of moves.toSorted((a, b) => b.number - a.number)) {
    if (!move.holdHarmless) break;
    if (move.fromVersionId !== versionId) held.add(move.fromVersionId);
  }
  return [...held];
}
