'use client';

import { useEffect, useRef } from 'react';
import { ImportDone } from './import-done';
import { RowsStep } from './rows-step';
import { TextStep } from './text-step';
import { useRosterImport } from './use-roster-import';

interface RosterImportProps {
  sectionId: string;
  madeIdRule: string;
}

export function RosterImport({ sectionId, madeIdRule }: RosterImportProps) {
  const state = useRosterImport(sectionId);
  const { step } = state;
  const top = useRef<HTMLDivElement>(null);
  const shown = useRef(step.at);
  useEffect(() => {
    if (shown.current === step.at) return;
    shown.current = step.at;
    top.current?.focus();
  }, [step.at]);
  return (
    <div ref={top} tabIndex={-1} className="scroll-mt-24 outline-none">
      {step.at === 'text' ? <TextStep state={state} madeIdRule={madeIdRule} /> : null}
      {step.at === 'rows' ? (
        <RowsStep key={step.looked.preview.seen} state={state} looked={step.looked} />
      ) : null}
      {step.at === 'done' ? (
        <ImportDone sectionId={sectionId} imported={step.imported} startOver={state.startOver} />
      ) : null}
    </div>
  );
}
