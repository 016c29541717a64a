'use client';

import { memo } from 'react';
import { classNames } from '@/components/ui/class-names';
import { AXES } from '@/lib/scoring';
import { CellLabel } from './cell-label';
import { CELL, ROW } from './cut-list-layout';
import { LineCell } from './line-cell';
import { PartInHand } from './part-in-hand';
import { NotesBelow } from './row-notes';
import { RowNumber } from './row-number';
import { RowPrices } from './row-prices';
import { type CutListRowProps, isSameRow } from './row-props';
import { RowStrip } from './row-strip';

/** One line of the cut list; what it does not say is as for all lines. */
function Row(row: CutListRowProps) {
  const { line, index, notes, inHand, isDragged, isLast } = row;
  const name = line.label.trim() || `line ${index + 1}`;
  return (
    <>
      <tr
        data-line={index}
        className={classNames(
          ROW,
          'items-end border-b border-hair py-2 lg:py-1.5',
          isDragged && 'bg-act-wash',
          notes.length > 0 && 'border-b-0',
          inHand && 'max-xl:border-b-0',
        )}
      >
        <TargetCells {...{ row, name }} />
        <RowPrices {...{ row, name }} />
        {inHand ? (
          <td className={CELL.strip}>
            <RowStrip {...{ index, name, isLast }} sheet={row.sheet} isFirst={index === 0} />
          </td>
        ) : null}
      </tr>
      <NotesBelow notes={notes} />
      {inHand ? (
        <tr className="block overflow-hidden border-b border-hair pb-2 xl:hidden">
          <td className="block lg:pl-10">
            <PartInHand inRow />
          </td>
        </tr>
      ) : null}
    </>
  );
}

/** What is asked for: the part, how many, its sizes, and the note once there is one or the row is in hand. */
function TargetCells({ row, name }: { row: CutListRowProps; name: string }) {
  const { line, index, keys, dragger, inHand } = row;
  const showNote = inHand || line.note !== '' || row.notes.some(({ field }) => field === 'note');
  return (
    <>
      <td className={CELL.number}>
        <RowNumber
          {...{ index, name, inHand, keys, dragger }}
          selected={row.selected === 'line'}
          onOpen={() => row.select({ kind: 'line', lineId: line.id })}
        />
      </td>
      <td className={CELL.label}>
        <CellLabel>part</CellLabel>
        <LineCell row={row} column="label" label={`part, line ${index + 1}`} />
      </td>
      <td className={CELL.quantity}>
        <CellLabel>pieces</CellLabel>
        <LineCell row={row} column="quantity" label={`pieces, ${name}`} />
      </td>
      {AXES.map((axis) => (
        <td key={axis} className={CELL.wide}>
          <CellLabel>{axis}</CellLabel>
          <LineCell row={row} column={axis} label={`${axis}, ${name}`} />
        </td>
      ))}
      <td className={showNote ? CELL.note : 'hidden'}>
        {showNote ? <LineCell row={row} column="note" label={`note, ${name}`} /> : null}
      </td>
    </>
  );
}

/** Drawn again only when something of this row is another: typing in one row leaves two hundred others alone. */
export const CutListRow = memo(Row, isSameRow);
