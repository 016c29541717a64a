'use client';

import { useDeferredValue, useState } from 'react';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import { TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';
import { reviewInstruments } from '@/lib/practicals/band-chances';
import { textAt } from '@/lib/practicals/draft-paths';
import { type EditorStep, stepOfPath } from '@/lib/practicals/field-names';
import { type ParsedDraft, parseDraft } from '@/lib/practicals/parse-draft';
import { placeFindings } from '@/lib/practicals/place-findings';
import { reviewLabels } from '@/lib/practicals/review-labels';
import { reviewRubric } from '@/lib/scoring';
import type { Editor, Selection } from './editor-context';
import type { DraftDesk } from './use-draft';

/** The finest that a shop's rule is read to. */
const GRADUATION = { in: TICKS_PER_INCH / 64, mm: TICKS_PER_MM / 2 };

interface EditorState extends Editor {
  wrong: Record<EditorStep, number>;
  refuse(): void;
}

const LINE = /^lines\.(\d+)\./;

/** What all sheets of the editor share. Reading a long list takes longer than a key press: it follows the typing. */
export function useEditorState(view: PracticalView, desk: DraftDesk): EditorState {
  const [focused, setPath] = useState<string | null>(null);
  const [refused, setRefused] = useState(false);
  const [judged, setJudged] = useState<ReadonlySet<string>>(new Set());
  const [lineInHand, takeUp] = useState<string | null>(null);
  const [selection, setSelection] = useState<Selection>({ kind: 'size', lineId: null, axis: 'length' });
  const [verbs] = useState(() => ({
    setFocused(path: string | null) {
      setPath(path);
      const line = desk.now().lines[Number(LINE.exec(path ?? '')?.[1] ?? -1)];
      if (line) takeUp(line.id);
    },
    judge: (lineIds: readonly string[]) => setJudged((before) => new Set([...before, ...lineIds])),
    select(next: Selection) {
      setSelection(next);
      if (next.lineId !== null) takeUp(next.lineId);
    },
    refuse: () => setRefused(true),
  }));
  const settled = useDeferredValue(desk.draft);
  const parsed = parseDraft(settled);

  const lineAt = (path: string | null) => settled.lines[Number(LINE.exec(path ?? '')?.[1] ?? -1)];
  const inHand = lineAt(focused);
  const errorsAt = (path: string) => {
    const errors = parsed.ok ? [] : (parsed.errors[path] ?? []);
    if (errors.length === 0) return errors;
    const isLeft = focused !== path && textAt(settled, path).trim() !== '';
    const line = lineAt(path);
    const isJudged = line !== undefined && line !== inHand && judged.has(line.id);
    const isOfList = path === 'lines' && settled.lines.length > 0;
    return refused || isLeft || isJudged || isOfList ? errors : [];
  };
  const reviewed = parsed.ok
    ? placeFindings(settled, parsed.rubric, [
        ...reviewRubric(parsed.rubric, { graduation: GRADUATION[view.unit] }),
        ...reviewInstruments(parsed.rubric),
      ])
    : [];
  return {
    practicalId: view.practicalId,
    desk,
    settled,
    unit: view.unit,
    parsed,
    latest: view.latest,
    findings: [...reviewed, ...reviewLabels(settled.lines)],
    focused,
    lineInHand,
    errorsAt,
    selection,
    wrong: countWrong(parsed, errorsAt),
    ...verbs,
  };
}

function countWrong(parsed: ParsedDraft, errorsAt: Editor['errorsAt']): Record<EditorStep, number> {
  const wrong = { task: 0, prices: 0, rules: 0 };
  for (const path of Object.keys(parsed.ok ? {} : parsed.errors)) {
    if (errorsAt(path).length > 0) wrong[stepOfPath(path)] += 1;
  }
  return wrong;
}
