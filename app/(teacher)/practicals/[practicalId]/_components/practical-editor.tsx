'use client';

import { useState } from 'react';
import { flushSync } from 'react-dom';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import { TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';
import { textAt } from '@/lib/practicals/draft-paths';
import { type EditorStep, stepOfPath } from '@/lib/practicals/field-names';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { placeFindings } from '@/lib/practicals/place-findings';
import { reviewRubric } from '@/lib/scoring';
import { AsideNotes } from './aside-notes';
import { type Editor, EditorProvider, fieldId, type Selection } from './editor-context';
import { KeepNote } from './keep-note';
import { PricesStep } from './prices-step';
import { PublishButton } from './publish-button';
import { RulesStep } from './rules-step';
import { StaleDialog } from './stale-dialog';
import { Steps, useStep } from './steps';
import { TaskStep } from './task-step';
import { titleBlockOf } from './title-block-of';
import { type DraftDesk, useDraft } from './use-draft';
import { WhatItGives } from './what-it-gives';

/** The finest that a shop's rule is read to. */
const GRADUATION = { in: TICKS_PER_INCH / 64, mm: TICKS_PER_MM / 2 };

const SHEETS = { task: TaskStep, prices: PricesStep, rules: RulesStep };

/** The desk on which a practical is written: its sheets, what it gives at once, and publishing. */
export function PracticalEditor({ view }: { view: PracticalView }) {
  const { content, revision, savedAt } = view.draft;
  const desk = useDraft(view.practicalId, { content, revision, at: savedAt });
  const editor = useEditorState(view, desk);
  const [step, setStep] = useStep();
  const Sheet = SHEETS[step];

  function onBadFields() {
    const [first = ''] = Object.keys(editor.parsed.ok ? {} : editor.parsed.errors);
    flushSync(() => editor.refuse());
    flushSync(() => setStep(stepOfPath(first)));
    document.getElementById(fieldId(first))?.focus();
  }

  return (
    <EditorProvider value={editor}>
      <DeskPage
        title={desk.draft.title.trim() || view.title}
        tabs={<Steps current={step} wrong={editor.wrong} onStep={setStep} />}
        wideHead
        actions={
          <>
            <KeepNote keep={desk.keep} />
            {view.latest ? (
              <>
                <LinkButton href={`/practicals/${view.practicalId}/practice`}>practice round</LinkButton>
                <LinkButton href={`/sittings/new?practical=${view.practicalId}`}>open a sitting</LinkButton>
              </>
            ) : null}
            <PublishButton
              practicalId={view.practicalId}
              parsed={editor.parsed}
              latest={view.latest}
              department={view.department}
              {...{ desk, onBadFields }}
            />
          </>
        }
        aside={
          <div className="grid content-start gap-8 md:grid-cols-[minmax(0,26rem)_minmax(0,20rem)] xl:grid-cols-1">
            <WhatItGives />
            <AsideNotes view={view} />
          </div>
        }
        titleBlock={titleBlockOf(view, editor.parsed, desk.draft)}
      >
        <Sheet />
      </DeskPage>
      <StaleDialog desk={desk} />
    </EditorProvider>
  );
}

interface EditorState extends Editor {
  wrong: Record<EditorStep, number>;
  refuse(): void;
}

function useEditorState(view: PracticalView, desk: DraftDesk): EditorState {
  const [focused, setFocused] = useState<string | null>(null);
  const [refused, setRefused] = useState(false);
  const [selection, select] = useState<Selection>({ kind: 'size', lineId: null, axis: 'length' });
  const parsed = parseDraft(desk.draft);
  const errorsAt = (path: string) => {
    const errors = parsed.ok ? [] : (parsed.errors[path] ?? []);
    const isLeft = focused !== path && textAt(desk.draft, path).trim() !== '';
    return refused || isLeft ? errors : [];
  };
  const wrong = { task: 0, prices: 0, rules: 0 };
  for (const path of Object.keys(parsed.ok ? {} : parsed.errors)) {
    if (errorsAt(path).length > 0) wrong[stepOfPath(path)] += 1;
  }
  return {
    desk,
    unit: view.unit,
    parsed,
    latest: view.latest,
    findings: parsed.ok
      ? placeFindings(desk.draft, reviewRubric(parsed.rubric, { graduation: GRADUATION[view.unit] }))
      : [],
    focused,
    setFocused,
    errorsAt,
    selection,
    select,
    wrong,
    refuse: () => setRefused(true),
  };
}
