'use client';

import { useState } from 'react';
import { PartDrawing } from '@/components/part/part-drawing';
import { classNames } from '@/components/ui/class-names';
import type { Length } from '@/lib/length';
import { readQuantity } from '@/lib/practicals/field-reader';
import { isSame } from '@/lib/practicals/share-unchanged';
import { AXES, type Axis } from '@/lib/scoring';
import { lineOf, useEditor } from './editor-context';
import { readSize, sizesOf } from './read-draft';

interface Drawn {
  lineId: string;
  size: Record<Axis, Length>;
}

/** The part of the row in hand, drawn as it is typed; while a size cannot be read, as it last could be. `inRow`: the row above says the rest. */
export function PartInHand({ inRow = false, className }: { inRow?: boolean; className?: string }) {
  const { desk, unit, lineInHand, focused, selection } = useEditor();
  const [last, setLast] = useState<Drawn | null>(null);
  const { lines } = desk.draft;
  const found = lineOf(lines, lineInHand) ?? lineOf(lines, lines[0]?.id ?? null);
  if (!found) return null;
  const { line, index } = found;
  const size = sizesOf(line, unit);
  if (size && !isSame(last, { lineId: line.id, size })) setLast({ lineId: line.id, size });
  const drawn = size ?? (last?.lineId === line.id ? last.size : null);
  const unread = AXES.filter((axis) => readSize(line[axis], unit) === null);
  const name = line.label.trim() || `line ${index + 1}`;
  const pieces = readQuantity(line.quantity);
  const cell = AXES.find((axis) => focused === `lines.${index}.${axis}`);
  const priced = selection.kind === 'size' && selection.lineId === line.id ? selection.axis : null;
  return (
    <section aria-label="part in hand" className={className}>
      <p
        className={classNames(
          'flex h-[43px] items-end justify-between gap-3 border-b-outline border-ink pb-1.5',
          inRow && 'hidden',
        )}
      >
        <span className="min-w-0 truncate text-heading font-[660] first-letter:uppercase">{name}</span>
        <span className="tnum shrink-0 text-label text-ink-2">
          {pieces === null ? 'pieces not read yet' : `${pieces} ${pieces === 1 ? 'piece' : 'pieces'}`}
        </span>
      </p>
      {drawn ? (
        <PartDrawing
          size={drawn}
          unit={unit}
          axis={cell ?? priced}
          withInstrument={false}
          label={name}
          width={400}
          height={290}
          className={classNames('-mt-8', inRow && 'max-w-[19rem]', size === null && 'opacity-55')}
        />
      ) : null}
      {unread.length > 0 ? (
        <p className="mt-1 max-w-[44ch] text-label text-ink-2">
          {drawn
            ? `Drawn as it was: the ${listed(unread)} cannot be read now.`
            : `The part is drawn as soon as its ${listed(unread)} can be read.`}
        </p>
      ) : null}
    </section>
  );
}

function listed(axes: readonly Axis[]): string {
  return axes.length < 2 ? axes.join() : `${axes.slice(0, -1).join(', ')} and ${axes.at(-1)}`;
}
