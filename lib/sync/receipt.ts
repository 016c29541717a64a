import { cellKey } from './cells';
import { type CellEvent, deriveCells } from './derive';

/** Letters and digits that are not mistaken for one another when read aloud or copied by hand. */
const ALPHABET = '23456789ABCDEFGHJKMNPQRSTVWXYZ';
const SYMBOLS = 8;

/**
 * The receipt of a locked prediction: eight symbols from a SHA-256 of the attempt and its own readings as they stand.
 * The same readings always give the same receipt; a changed one gives another, whatever the order of the events.
 */
export async function receiptOf(attemptId: string, events: readonly CellEvent[]): Promise<string> {
  const lines = [...deriveCells(events, 'own').values()]
    .filter(
      (state) => !state.cell.what.startsWith('@') && state.value !== null && state.value.kind !== 'cleared',
    )
    .map((state) => `${cellKey(state.cell)}=${canonical(state.value)}`)
    .sort();
  const bytes = new TextEncoder().encode([attemptId, ...lines].join('\n'));
  const digest = new Uint8Array(await crypto.subtle.digest('SHA-256', bytes));
  const symbols = Array.from(digest.slice(0, SYMBOLS), (byte) => ALPHABET[byte % ALPHABET.length]).join('');
  return `${symbols.slice(0, 4)}-${symbols.slice(4)}`;
}

function canonical(value: unknown): string {
  return JSON.stringify(Object.entries(value ?? {}).sort(([a], [b]) => (a < b ? -1 : 1)));
}
