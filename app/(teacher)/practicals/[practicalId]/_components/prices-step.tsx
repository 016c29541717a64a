'use client';

import { ChecksEditor } from './checks-editor';
import { CutList } from './cut-list';
import { useEditor } from './editor-context';
import { LineDetail } from './line-detail';
import { SizeEditor } from './size-editor';
import { useSheet } from './use-sheet';

/** The cut list above, and below it what is in hand: a price, the checks, or one line. */
export function PricesStep() {
  const { selection } = useEditor();
  const sheet = useSheet();
  return (
    <>
      <CutList sheet={sheet} />
      {selection.kind === 'size' ? (
        <SizeEditor key={`${selection.lineId} ${selection.axis}`} {...selection} />
      ) : selection.kind === 'checks' ? (
        <ChecksEditor lineId={selection.lineId} />
      ) : (
        <LineDetail lineId={selection.lineId} sheet={sheet} />
      )}
    </>
  );
}
