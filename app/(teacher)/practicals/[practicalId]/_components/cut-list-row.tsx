'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { type DraftLine, isException } from '@/lib/practicals/draft';
import { AXES } from '@/lib/scoring';
import { CellLabel } from './cell-label';
import { ChecksCell } from './checks-cell';
import { CELL, ROW } from './cut-list-layout';
import { useEditor } from './editor-context';
import { PriceCell } from './price-cell';
import { dearestOf } from './read-draft';
import { RowNotes } from './row-notes';
import { SheetCell } from './sheet-cell';
import type { Sheet } from './use-sheet';

const FIELDS = ['label', 'quantity', ...AXES, 'worth', 'missing'];

interface CutListRowProps {
  line: DraftLine;
  index: number;
  sheet: Sheet;
}

/** One line of the cut list; what it does not say is as for all lines. */
export function CutListRow({ line, index, sheet }: CutListRowProps) {
  const { desk, selection, select } = useEditor();
  const at = `lines.${index}`;
  const name = line.label || `line ${index + 1}`;
  const dearest = dearestOf(desk.draft);
  const [opened, setOpened] = useState(false);
  const folded = !opened && !isException(line);
  const priced = classNames(CELL.wide, folded && 'max-lg:hidden');
  const selected = selection.kind === 'line' && selection.lineId === line.id;
  const cell = (column: string) => ({
    path: `${at}.${column}`,
    label: `${column}, ${name}`,
    onKeyDown: (event: React.KeyboardEvent<HTMLInputElement>) => sheet.onKeyDown(event, index, column),
    onPaste: (event: React.ClipboardEvent<HTMLInputElement>) => sheet.onPaste(event, index, column),
  });
  return (
    <>
      <tr className={classNames(ROW, 'items-end border-b border-hair py-2 lg:py-1.5')}>
        <td className={CELL.number}>
          <button
            type="button"
            aria-pressed={selected}
            aria-label={`line ${index + 1}, ${name}: drawing, note, move, remove`}
            onClick={() => select({ kind: 'line', lineId: line.id })}
            className={classNames(
              'tnum block h-9 w-full border-b border-transparent text-left leading-6 text-ink-2 hover:border-ink hover:text-ink',
              selected && 'border-b-edge border-act font-[640] text-ink',
            )}
          >
            {index + 1}
          </button>
        </td>
        <td className={CELL.label}>
          <CellLabel>part</CellLabel>
          <SheetCell {...cell('label')} label={`part, line ${index + 1}`} />
        </td>
        <td className={CELL.quantity}>
          <CellLabel>pieces</CellLabel>
          <SheetCell {...cell('quantity')} label={`pieces, ${name}`} />
        </td>
        {AXES.map((axis) => (
          <td key={axis} className={CELL.wide}>
            <CellLabel>{axis}</CellLabel>
            <SheetCell {...cell(axis)} isLength />
          </td>
        ))}
        {folded ? (
          <td className="col-span-6 lg:hidden">
            <Button kind="quiet" size="small" className="px-0" onClick={() => setOpened(true)}>
              priced as all lines: change it for {name}
            </Button>
          </td>
        ) : null}
        <td className={priced}>
          <CellLabel>worth</CellLabel>
          <SheetCell {...cell('worth')} placeholder="as all" />
        </td>
        <td className={priced}>
          <CellLabel>missing</CellLabel>
          <SheetCell {...cell('missing')} placeholder="as all" />
        </td>
        <td className={priced}>
          <CellLabel>checks</CellLabel>
          <ChecksCell lineId={line.id} checks={line.checks} />
        </td>
        {AXES.map((axis) => (
          <td key={axis} className={priced}>
            <CellLabel>price of {axis}</CellLabel>
            <PriceCell
              lineId={line.id}
              rule={line.sizes[axis]}
              path={`${at}.sizes.${axis}`}
              {...{ axis, dearest }}
            />
          </td>
        ))}
      </tr>
      <RowNotes base={at} fields={FIELDS} />
    </>
  );
}
