import { CrowsFoot } from '@/components/rule/rule-pointers';
import type { OwnRecord } from '@/lib/practicals/own-record';
import { pieceStateAt, valueAt } from '@/lib/round/record';
import type { Spot } from '@/lib/round/types';

/** What is recorded of a size, without what was read. */
export type SizeMark = 'open' | 'read' | 'unreadable' | 'spoiled' | 'missing' | 'two';

export const MARK_WORDS: Record<SizeMark, string> = {
  open: 'not recorded',
  read: 'recorded',
  unreadable: 'couldn’t read',
  spoiled: 'spoiled',
  missing: 'piece is missing',
  two: 'two readings, measure again',
};

export function markAt(record: OwnRecord, { lineId, ordinal, axis }: Spot): SizeMark {
  if (pieceStateAt(record, { lineId, ordinal }) === 'missing') return 'missing';
  const value = valueAt(record, { lineId, ordinal, what: axis });
  if (value === null) return 'open';
  if (value === 'conflict') return 'two';
  return value.kind === 'unreadable' || value.kind === 'spoiled' ? value.kind : 'read';
}

/** An own reading is an open crow's foot here as on the rule. */
export function MarkFace({ mark }: { mark: SizeMark }) {
  if (mark === 'open') return null;
  if (mark === 'unreadable') return <span className="font-[660]">?</span>;
  if (mark === 'two') return <span className="font-[660] text-refuse">2</span>;
  return (
    <svg aria-hidden="true" viewBox="0 0 24 20" className="h-5 w-6">
      {mark === 'read' ? <CrowsFoot kind="own" x={12} y={17} size={13} /> : null}
      {mark === 'spoiled' ? (
        <path d="M2 10H8L10 4L14 16L16 10H22" className="fill-none stroke-ink [stroke-width:1.75]" />
      ) : null}
      {mark === 'missing' ? (
        <path d="M3 2L21 18M21 2L3 18" className="stroke-rule [stroke-width:1.25]" />
      ) : null}
    </svg>
  );
}
