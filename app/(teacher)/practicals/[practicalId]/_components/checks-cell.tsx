'use client';

import { classNames } from '@/components/ui/class-names';
import type { DraftCheck } from '@/lib/practicals/draft';
import { lineOf, useEditor } from './editor-context';

/** "square 1, surface 1": each check with the most it can cost. */
function checksAsText(checks: readonly DraftCheck[]): string {
  if (checks.length === 0) return 'none';
  return checks.map(({ label, levels }) => `${label || '?'} ${levels.at(-1)?.lose ?? ''}`.trim()).join(', ');
}

export function ChecksCell({ lineId, checks }: { lineId: string | null; checks: DraftCheck[] | null }) {
  const { desk, selection, select } = useEditor();
  const selected = selection.kind === 'checks' && selection.lineId === lineId;
  const name = lineId === null ? 'all lines' : lineOf(desk.draft.lines, lineId)?.line.label || 'line';
  const text = checks === null ? 'as all' : checksAsText(checks);
  return (
    <button
      type="button"
      aria-pressed={selected}
      aria-label={`checks, ${name}: ${text}`}
      onClick={() => select({ kind: 'checks', lineId })}
      className={classNames(
        'block min-h-9 w-full border-b border-transparent px-1 text-left leading-6 hover:border-ink lg:h-9 lg:truncate',
        checks === null ? 'text-label text-ink-2' : 'narrow border-rule text-text',
        selected && 'border-b-edge border-act bg-plate',
      )}
    >
      {text}
    </button>
  );
}
