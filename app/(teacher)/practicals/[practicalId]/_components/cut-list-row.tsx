'use client';

import { memo, useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import type { Unit } from '@/lib/length';
import { type DraftLine, isException } from '@/lib/practicals/draft';
import type { PlacedFinding } from '@/lib/practicals/place-findings';
import { AXES, type Axis } from '@/lib/scoring';
import { AsAllKey } from './as-all-key';
import { CellInput } from './cell-input';
import { CellLabel } from './cell-label';
import { ChecksCell } from './checks-cell';
import { CELL, ROW } from './cut-list-layout';
import type { Editor } from './editor-context';
import { PartInHand } from './part-in-hand';
import { PriceCell } from './price-cell';
import { NotesBelow } from './row-notes';
import { RowNumber } from './row-number';
import { RowStrip } from './row-strip';
import type { SheetDesk } from './sheet-desk';
import type { SheetKeys } from './sheet-keys';
import type { RowDragger } from './use-row-drag';

export const LINE_FIELDS = ['label', 'quantity', ...AXES, 'note', 'worth', 'missing'] as const;

type LineField = (typeof LINE_FIELDS)[number];

export interface RowNote {
  field: string;
  path: string;
  errors: string[];
  found: PlacedFinding[];
}

export interface CutListRowProps {
  line: DraftLine;
  index: number;
  isLast: boolean;
  unit: Unit;
  notes: RowNote[];
  /** The field of this row that has the cursor. */
  focused: string | null;
  inHand: boolean;
  isDragged: boolean;
  /** What of this row is laid out below the sheet. */
  selected: Axis | 'checks' | 'line' | null;
  dearest: number;
  sheet: SheetDesk;
  keys: SheetKeys;
  dragger: RowDragger;
  select: Editor['select'];
  setFocused: Editor['setFocused'];
  type(path: string, text: string): void;
}

/** One line of the cut list; what it does not say is as for all lines. */
function Row(props: CutListRowProps) {
  const { line, index, unit, notes, focused, inHand, selected, dearest, sheet, keys, select } = props;
  const at = `lines.${index}`;
  const name = line.label.trim() || `line ${index + 1}`;
  const [opened, setOpened] = useState(false);
  const folded = !opened && !isException(line);
  const priced = classNames(CELL.wide, folded && 'max-lg:hidden');
  const showNote = inHand || line.note !== '' || notes.some(({ field }) => field === 'note');
  const cell = (column: LineField, label = `${column}, ${name}`) => {
    const note = notes.find(({ field }) => field === column);
    return (
      <CellInput
        path={`${at}.${column}`}
        label={label}
        text={line[column]}
        sizeIn={AXES.some((axis) => axis === column) ? unit : null}
        inHand={focused === column}
        refused={(note?.errors.length ?? 0) > 0}
        found={note?.found.some(({ isNote }) => !isNote) ?? false}
        noted={note !== undefined}
        isNote={column === 'note'}
        placeholder={
          column === 'note'
            ? 'note for the students'
            : column === 'worth' || column === 'missing'
              ? 'as all'
              : undefined
        }
        onType={(text) => props.type(`${at}.${column}`, text)}
        onFocus={() => {
          props.setFocused(`${at}.${column}`);
          keys.onFocus(index, column, line[column]);
        }}
        onBlur={() => props.setFocused(null)}
        onKeyDown={(event) => keys.onKeyDown(event, index, column)}
        onPaste={(event) => keys.onPaste(event, index, column)}
      />
    );
  };
  return (
    <>
      <tr
        data-line={index}
        className={classNames(
          ROW,
          'items-end border-b border-hair py-2 lg:py-1.5',
          props.isDragged && 'bg-act-wash',
          notes.length > 0 && 'border-b-0',
          inHand && 'max-xl:border-b-0',
        )}
      >
        <td className={CELL.number}>
          <RowNumber
            {...{ index, name, inHand, keys }}
            dragger={props.dragger}
            selected={selected === 'line'}
            onOpen={() => select({ kind: 'line', lineId: line.id })}
          />
        </td>
        <td className={CELL.label}>
          <CellLabel>part</CellLabel>
          {cell('label', `part, line ${index + 1}`)}
        </td>
        <td className={CELL.quantity}>
          <CellLabel>pieces</CellLabel>
          {cell('quantity', `pieces, ${name}`)}
        </td>
        {AXES.map((axis) => (
          <td key={axis} className={CELL.wide}>
            <CellLabel>{axis}</CellLabel>
            {cell(axis)}
          </td>
        ))}
        <td className={showNote ? CELL.note : 'hidden'}>{showNote ? cell('note') : null}</td>
        {folded ? (
          <td className="col-span-6 lg:hidden">
            <Button kind="quiet" size="small" className="px-0" onClick={() => setOpened(true)}>
              priced as all lines: change it for {name}
            </Button>
          </td>
        ) : null}
        <td className={priced}>
          <CellLabel>worth</CellLabel>
          {cell('worth')}
        </td>
        <td className={priced}>
          <CellLabel>missing</CellLabel>
          {cell('missing')}
        </td>
        <td className={priced}>
          <CellLabel>checks</CellLabel>
          {line.checks === null ? (
            <AsAllKey
              label={`checks, ${name}: as all`}
              selected={selected === 'checks'}
              onPress={() => select({ kind: 'checks', lineId: line.id })}
            />
          ) : (
            <ChecksCell lineId={line.id} checks={line.checks} />
          )}
        </td>
        {AXES.map((axis) => (
          <td key={axis} className={priced}>
            <CellLabel>price of {axis}</CellLabel>
            {line.sizes[axis] === null ? (
              <AsAllKey
                label={`price of ${axis}, ${name}: as all lines`}
                selected={selected === axis}
                onPress={() => select({ kind: 'size', lineId: line.id, axis })}
              />
            ) : (
              <PriceCell
                lineId={line.id}
                rule={line.sizes[axis]}
                path={`${at}.sizes.${axis}`}
                {...{ axis, dearest }}
              />
            )}
          </td>
        ))}
        {inHand ? (
          <td className={CELL.strip}>
            <RowStrip {...{ index, name, sheet }} isFirst={index === 0} isLast={props.isLast} />
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

/** Drawn again only when something of this row is another: typing in one row leaves two hundred others alone. */
export const CutListRow = memo(Row, (before, after) => isSameRow(before, after));

function isSameRow(before: CutListRowProps, after: CutListRowProps): boolean {
  const { notes, ...rest } = before;
  const { notes: notesAfter, ...restAfter } = after;
  return JSON.stringify(notes) === JSON.stringify(notesAfter) && shallowSame(rest, restAfter);
}

function shallowSame(a: object, b: object): boolean {
  const [before, after] = [new Map(Object.entries(a)), new Map(Object.entries(b))];
  return [...before].every(([key, value]) => Object.is(value, after.get(key)));
}
