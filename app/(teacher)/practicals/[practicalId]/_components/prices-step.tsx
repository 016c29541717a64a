'use client';

import { type RefObject, useEffect, useRef, useState } from 'react';
import type { TriedPiece } from '@/lib/practicals/try-piece';
import { ChecksEditor } from './checks-editor';
import { CutList } from './cut-list';
import { type Selection, useEditor } from './editor-context';
import { LineDetail } from './line-detail';
import { SizeEditor } from './size-editor';
import { useSheet } from './use-sheet';

/** What is laid out once the line that was in hand is removed. */
const ALL_LINES: Selection = { kind: 'size', lineId: null, axis: 'length' };

/** The cut list above, and below it what is in hand: a price, the checks, or one line. */
export function PricesStep() {
  const { selection: selected, desk } = useEditor();
  const sheet = useSheet();
  const isGone = selected.lineId !== null && !desk.draft.lines.some(({ id }) => id === selected.lineId);
  const selection = isGone ? ALL_LINES : selected;
  const [tried, setTried] = useState<Record<string, TriedPiece>>({});
  const detail = useRef<HTMLDivElement>(null);
  useWayBack(selected, detail);
  return (
    <>
      <CutList {...sheet} />
      <div ref={detail} tabIndex={-1} className="scroll-mt-4">
        {selection.kind === 'size' ? (
          <SizeEditor
            key={`${selection.lineId} ${selection.axis}`}
            {...selection}
            tried={tried}
            onTry={(lineId, piece) => setTried({ ...tried, [lineId]: piece })}
          />
        ) : selection.kind === 'checks' ? (
          <ChecksEditor lineId={selection.lineId} />
        ) : (
          <LineDetail lineId={selection.lineId} sheet={sheet.sheet} />
        )}
      </div>
    </>
  );
}

/** What was opened by keyboard takes the cursor along, and Escape brings it back to the cell. */
function useWayBack(selection: Selection, detail: RefObject<HTMLElement | null>): void {
  const from = useRef<HTMLElement | null>(null);
  const seen = useRef(selection);
  useEffect(() => {
    if (seen.current === selection) return;
    seen.current = selection;
    const cell = document.activeElement;
    const isCell = cell instanceof HTMLElement && cell.closest('table') !== null;
    if (isCell && cell.matches(':focus-visible')) {
      from.current = cell;
      detail.current?.focus();
    } else detail.current?.scrollIntoView({ block: 'nearest' });
  }, [selection, detail]);
  useEffect(() => {
    const sheet = detail.current;
    const goBack = (event: KeyboardEvent) => {
      if (event.key === 'Escape' && !event.defaultPrevented) from.current?.focus();
    };
    sheet?.addEventListener('keydown', goBack);
    return () => sheet?.removeEventListener('keydown', goBack);
  }, [detail]);
}
