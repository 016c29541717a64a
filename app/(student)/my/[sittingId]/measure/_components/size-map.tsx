'use client';

import { CrowsFoot } from '@/components/rule/rule-pointers';
import { ScrollRegion } from '@/components/table/scroll-region';
import { classNames } from '@/components/ui/class-names';
import type { OwnRecord } from '@/lib/practicals/own-record';
import { isSameSpot, listPieces } from '@/lib/round/pieces';
import { pieceStateAt, valueAt } from '@/lib/round/record';
import type { Spot } from '@/lib/round/types';
import { AXES, type Rubric } from '@/lib/scoring';

interface SizeMapProps {
  rubric: Rubric;
  record: OwnRecord;
  spot: Spot | null;
  onPoint: (spot: Spot) => void;
}

/** Every size as a small cell: pieces across, axes down. It tells what is recorded, not what was read. */
export function SizeMap({ rubric, record, spot, onPoint }: SizeMapProps) {
  const pieces = listPieces(rubric);
  return (
    <ScrollRegion>
      <table className="w-full table-fixed border-collapse">
        <caption className="sr-only">your sizes</caption>
        <colgroup>
          <col className="w-16" />
          {pieces.map(({ label }) => (
            <col key={label} className="min-w-7" />
          ))}
        </colgroup>
        <thead>
          <tr>
            <td />
            {rubric.lines.map((line) => (
              <th
                key={line.id}
                colSpan={line.quantity}
                scope="colgroup"
                className={classNames(
                  'narrow overflow-hidden px-0.5 pb-0.5 align-bottom text-label leading-4 font-[480] text-ellipsis',
                  line.id === spot?.lineId ? 'font-[680] text-act' : 'text-ink-2',
                )}
              >
                {line.label}
              </th>
            ))}
          </tr>
        </thead>
        <tbody>
          {AXES.map((axis) => (
            <tr key={axis}>
              <th
                scope="row"
                className={classNames(
                  'narrow pr-2 text-right text-label font-[480]',
                  axis === spot?.axis ? 'font-[680] text-act' : 'text-ink-2',
                )}
              >
                {axis}
              </th>
              {pieces.map(({ line, ordinal, label }) => {
                const at = { lineId: line.id, ordinal, axis };
                const mark = markAt(record, at);
                const here = isSameSpot(at, spot);
                return (
                  <td
                    key={label}
                    className={classNames('p-0', ordinal === 1 && 'border-l-outline border-ink')}
                  >
                    <button
                      type="button"
                      aria-current={here ? 'location' : undefined}
                      aria-label={`${label}, ${axis}: ${MARK_WORDS[mark]}`}
                      onClick={() => onPoint(at)}
                      className={classNames(
                        'relative flex h-7 w-full touch-manipulation items-center justify-center border border-rule bg-plate focus-visible:z-1',
                        here && 'z-1 bg-act-wash outline-3 -outline-offset-2 outline-act',
                      )}
                    >
                      <MarkFace mark={mark} />
                    </button>
                  </td>
                );
              })}
            </tr>
          ))}
        </tbody>
      </table>
    </ScrollRegion>
  );
}

type Mark = 'open' | 'read' | 'unreadable' | 'spoiled' | 'missing' | 'two';

const MARK_WORDS: Record<Mark, string> = {
  open: 'not recorded',
  read: 'recorded',
  unreadable: 'couldn’t read',
  spoiled: 'spoiled',
  missing: 'piece is missing',
  two: 'two readings, measure again',
};

function markAt(record: OwnRecord, { lineId, ordinal, axis }: Spot): Mark {
  if (pieceStateAt(record, { lineId, ordinal }) === 'missing') return 'missing';
  const value = valueAt(record, { lineId, ordinal, what: axis });
  if (value === null) return 'open';
  if (value === 'conflict') return 'two';
  return value.kind === 'unreadable' || value.kind === 'spoiled' ? value.kind : 'read';
}

function MarkFace({ mark }: { mark: Mark }) {
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
