'use client';

import { PieceFace, pieceScale } from '@/components/part/piece-face';
import { ScrollRegion } from '@/components/table/scroll-region';
import { classNames } from '@/components/ui/class-names';
import type { Rubric } from '@/lib/scoring';

interface LineRowProps {
  rubric: Rubric;
  chosen: string;
  onChoose: (lineId: string) => void;
}

/** The cut list as its parts, on one base line and to one scale; each is a key. */
export function LineRow({ rubric, chosen, onChoose }: LineRowProps) {
  const scale = pieceScale(
    rubric.lines.map(({ target }) => target),
    { height: 84, columnWidth: 44 },
  );
  return (
    <ScrollRegion>
      <fieldset className="flex min-w-full">
        <legend className="sr-only">which part</legend>
        {rubric.lines.map((line) => (
          <button
            key={line.id}
            type="button"
            aria-pressed={line.id === chosen}
            onClick={() => onChoose(line.id)}
            className="group flex min-w-12 flex-1 touch-manipulation flex-col items-stretch justify-end select-none focus-visible:relative focus-visible:z-1"
          >
            <span className="flex justify-center border-b-outline border-ink px-1">
              <PieceFace
                size={line.target}
                scale={scale}
                state={line.id === chosen ? 'cursor' : 'present'}
                className="-mb-0.5"
              />
            </span>
            <span
              className={classNames(
                'min-h-11 px-1 pt-1 text-label leading-5',
                line.id === chosen ? 'font-[680] text-act' : 'group-hover:underline',
              )}
            >
              {line.label}
              {line.quantity > 1 ? <span className="text-ink-2"> × {line.quantity}</span> : null}
            </span>
          </button>
        ))}
      </fieldset>
    </ScrollRegion>
  );
}
