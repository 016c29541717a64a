'use client';

import { ScrollRegion } from '@/components/table/scroll-region';
import { classNames } from '@/components/ui/class-names';
import type { OwnRecord } from '@/lib/practicals/own-record';
import { isSameSpot, listPieces, type PiecePlace } from '@/lib/round/pieces';
import type { Spot } from '@/lib/round/types';
import { AXES, type Axis, type Rubric } from '@/lib/scoring';
import { MARK_WORDS, MarkFace, markAt } from './size-mark';

const NAMES_PX = 64;
const NARROWEST_PX = 28;

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
      <table
        className="w-full table-fixed border-collapse"
        style={{ minWidth: NAMES_PX + pieces.length * NARROWEST_PX }}
      >
        <caption className="sr-only">your sizes</caption>
        <colgroup>
          <col className="w-16" />
          {pieces.map(({ label }) => (
            <col key={label} />
          ))}
        </colgroup>
        <thead>
          <LineNames rubric={rubric} spot={spot} />
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
              {pieces.map((place) => (
                <SizeKey key={place.label} {...{ place, axis, record, spot, onPoint }} />
              ))}
            </tr>
          ))}
        </tbody>
      </table>
    </ScrollRegion>
  );
}

function LineNames({ rubric, spot }: { rubric: Rubric; spot: Spot | null }) {
  return (
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
  );
}

interface SizeKeyProps extends Pick<SizeMapProps, 'record' | 'spot' | 'onPoint'> {
  place: PiecePlace;
  axis: Axis;
}

function SizeKey({ place: { line, ordinal, label }, axis, record, spot, onPoint }: SizeKeyProps) {
  const at = { lineId: line.id, ordinal, axis };
  const mark = markAt(record, at);
  const here = isSameSpot(at, spot);
  return (
    <td className={classNames('p-0', ordinal === 1 && 'border-l-outline border-ink')}>
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
}
