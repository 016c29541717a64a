'use client';

import { useState } from 'react';
import { flushSync } from 'react-dom';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import { stepOfPath } from '@/lib/practicals/field-names';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { AsideNotes } from './aside-notes';
import { EditorProvider, fieldId, selectionOf } from './editor-context';
import { KeepNote } from './keep-note';
import { KeptInView } from './kept-in-view';
import { PartInHand } from './part-in-hand';
import { PricesStep } from './prices-step';
import { PublishButton } from './publish-button';
import { RulesStep } from './rules-step';
import { StaleDialog } from './stale-dialog';
import { Steps, useStep } from './steps';
import { TaskStep } from './task-step';
import { titleBlockOf } from './title-block-of';
import { useDraft } from './use-draft';
import { useEditorState } from './use-editor-state';
import { useTypedEarly } from './use-typed-early';
import { WhatItGives } from './what-it-gives';

const SHEETS = { task: TaskStep, prices: PricesStep, rules: RulesStep };

/** The desk on which a practical is written: its sheets, what it gives at once, and publishing. */
export function PracticalEditor({ view }: { view: PracticalView }) {
  const { content, revision, savedAt } = view.draft;
  const desk = useDraft(view.practicalId, { content, revision, at: savedAt });
  useTypedEarly(desk, content);
  const editor = useEditorState(view, desk);
  const [step, setStep] = useStep();
  const [looking, setLooking] = useState(false);
  const Sheet = SHEETS[step];

  function onBadFields() {
    const parsed = parseDraft(desk.now());
    const [first = ''] = Object.keys(parsed.ok ? {} : parsed.errors);
    flushSync(() => editor.refuse());
    flushSync(() => setStep(stepOfPath(first)));
    const shown = selectionOf(first, desk.draft);
    if (shown) flushSync(() => editor.select(shown));
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
            <KeepNote keep={desk.keep} onChoose={() => setLooking(false)} />
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
              behind={view.behind}
              {...{ desk, onBadFields }}
            />
          </>
        }
        aside={
          <div className="grid content-start gap-8 md:grid-cols-[minmax(0,26rem)_minmax(0,20rem)] xl:flex xl:flex-1 xl:flex-col xl:gap-0">
            <KeptInView>
              {step === 'prices' ? <PartInHand className="hidden pb-4 xl:block" /> : null}
              <WhatItGives />
            </KeptInView>
            <AsideNotes view={view} />
          </div>
        }
        titleBlock={titleBlockOf(view, editor.parsed, desk.draft)}
      >
        <Sheet />
      </DeskPage>
      <StaleDialog desk={desk} looking={looking} onLook={() => setLooking(true)} />
    </EditorProvider>
  );
}
