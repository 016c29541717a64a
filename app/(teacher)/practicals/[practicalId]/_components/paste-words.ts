import { MOST_DRAFT_LINES } from '@/lib/practicals/draft';
import type { PastedRows } from '@/lib/practicals/paste-rows';

const count = (number: number, one: string) => `${number} ${one}${number === 1 ? '' : 's'}`;

/** What a paste did and what it had no place for. */
export function pasteWords({ into, leftOut, shortened }: PastedRows, of: number, row: number): string {
  const kept = into.length;
  const where = kept === 1 ? `line ${row + 1}` : `lines ${row + 1} to ${row + kept}`;
  const { rows, cells, columns } = leftOut;
  return [
    `${count(kept, 'row')} pasted into ${where}`,
    rows > 0 ? `${rows} of ${of} rows left out: a draft keeps at most ${MOST_DRAFT_LINES} lines` : '',
    columns.length > 0 ? `left out, for want of a column: ${columns.join(', ')}` : '',
    cells > 0 ? `${count(cells, 'cell')} left out: no column for ${cells === 1 ? 'it' : 'them'}` : '',
    shortened > 0 ? `${count(shortened, 'cell')} shortened: more text than a cell keeps` : '',
  ]
    .filter(Boolean)
    .join('. ');
}
