import type { MoveChoices, MoveMade } from '@/lib/contracts/moves';

/** The latest move that was not taken back. */
export function standingMove({ moves }: Pick<MoveChoices, 'moves'>): MoveMade | null {
  return moves.find(({ undone }) => undone === null) ?? null;
}

/** Where a sitting stands and how it came there: "version 2, moved from 1, nobody drops". */
export function sayMoved({ version, moves }: Pick<MoveChoices, 'version' | 'moves'>): string {
  const move = standingMove({ moves });
  if (!move) return `version ${version.number}`;
  return `version ${version.number}, moved from ${move.from}${move.holdHarmless ? ', nobody drops' : ''}`;
}
