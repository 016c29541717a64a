'use client';

import { useRef } from 'react';
import { Button } from '@/components/ui/button';
import { AllLinesRow } from './all-lines-row';
import { CutListFoot } from './cut-list-foot';
import { CutListHead } from './cut-list-head';
import { CutListRow } from './cut-list-row';
import { type Editor, useEditor } from './editor-context';
import { dearestOf } from './read-draft';
import { notesOf, RowNotes } from './row-notes';
import { LINE_FIELDS } from './row-props';
import { RowsToMend } from './rows-to-mend';
import { SheetHelp } from './sheet-help';
import { useRowDrag } from './use-row-drag';
import type { useSheet } from './use-sheet';

/** The cut list and its prices, typed like a sheet. */
export function CutList({ sheet, keys, type, said }: ReturnType<typeof useSheet>) {
  const editor = useEditor();
  const { desk, settled, unit, errorsAt, findings, focused, selection, select, setFocused } = editor;
  const section = useRef<HTMLElement>(null);
  const { drag, dragger } = useRowDrag(sheet, section);
  const { lines } = desk.draft;
  const dearest = dearestOf(settled);
  return (
    <section
      ref={section}
      aria-label="cut list and prices"
      className="relative"
      onPaste={(event) => {
        const isField = event.target instanceof HTMLInputElement;
        if (!isField && sheet.pasteAtEnd(event.clipboardData.getData('text/plain'))) event.preventDefault();
      }}
    >
      <RowsToMend sheet={sheet} />
      <table className="block w-full">
        <caption className="sr-only">Cut list and prices, one line of parts a row.</caption>
        <CutListHead unit={unit} />
        <tbody className="block">
          <AllLinesRow />
          <RowNotes base="all" fields={['worth', 'missing']} />
          {lines.map((line, index) => (
            <CutListRow
              key={line.id}
              {...{ line, index, unit, dearest, sheet, keys, dragger, select, setFocused, type }}
              isLast={index === lines.length - 1}
              notes={notesOf(`lines.${index}`, LINE_FIELDS, errorsAt, findings)}
              focused={columnIn(focused, index)}
              inHand={editor.lineInHand === line.id}
              isDragged={drag?.from === index}
              selected={selectedOf(selection, line.id)}
            />
          ))}
        </tbody>
        <CutListFoot />
      </table>
      {drag ? (
        <div
          aria-hidden
          style={{ top: drag.top }}
          className="pointer-events-none absolute inset-x-0 z-[6] -mt-[2px] h-[3px] bg-act before:absolute before:-top-[5px] before:left-0 before:border-[6.5px] before:border-transparent before:border-l-act"
        />
      ) : null}
      {lines.length === 0 ? (
        <p className="py-4 text-ink-2">
          No lines yet. Add the first and type along, or copy rows in a spreadsheet and paste them here.
        </p>
      ) : null}
      <div className="mt-3 flex flex-wrap items-center gap-x-4 gap-y-2">
        <Button onClick={() => sheet.add()}>add a line</Button>
        <p role="status" className="text-label text-ink-2">
          {said.text}
        </p>
        {said.canUndo ? (
          <Button kind="quiet" size="small" className="px-1" onClick={() => sheet.undo()}>
            undo
          </Button>
        ) : null}
        <SheetHelp />
      </div>
    </section>
  );
}

function columnIn(focused: string | null, index: number): string | null {
  const at = `lines.${index}.`;
  return focused?.startsWith(at) ? focused.slice(at.length) : null;
}

function selectedOf(selection: Editor['selection'], lineId: string) {
  if (selection.lineId !== lineId) return null;
  return selection.kind === 'size' ? selection.axis : selection.kind;
}
