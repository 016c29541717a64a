'use client';

import { useState, useTransition } from 'react';
import type { RosterChoice } from '@/lib/contracts/sections';
import { MAX_FILE_BYTES, tooLong } from '@/lib/csv/decode-text';
import type { RosterText } from '@/lib/csv/read-roster';
import type { ImportedView } from '@/lib/data/sections/import-roster';
import type { FieldErrors } from '@/lib/result';
import {
  importRosterAction,
  type LookedAt,
  lookAtFileAction,
  lookAtTextAction,
  type Reply,
} from '../actions';

export type ImportStep =
  | { at: 'text' }
  | { at: 'rows'; looked: LookedAt }
  | { at: 'done'; imported: ImportedView };

const NO_ANSWER: FieldErrors = {
  '': [
    'The server did not answer. Nothing was changed, and the names are still here. Try again in a moment.',
  ],
};

/** The way of a text onto the roster: written or chosen, looked at row by row, brought in. Nothing typed is lost. */
export function useRosterImport(sectionId: string) {
  const [step, setStep] = useState<ImportStep>({ at: 'text' });
  const [kind, setKind] = useState<RosterText['kind']>('names');
  const [text, setText] = useState('');
  const [refused, setRefused] = useState<FieldErrors>({});
  const [pending, start] = useTransition();

  function attempt<T>(ask: () => Promise<Reply<T>>, settle: (value: T) => void) {
    start(async () => {
      const reply = await ask().catch((): Reply<T> => ({ ok: false, fields: NO_ANSWER }));
      start(() => {
        setRefused(reply.ok ? {} : reply.fields);
        if (reply.ok) settle(reply.value);
      });
    });
  }

  const lookBy = (ask: () => Promise<Reply<LookedAt>>) =>
    attempt(ask, (looked) => {
      setKind(looked.roster.kind);
      setText(looked.roster.text);
      setStep({ at: 'rows', looked });
    });

  function lookAtFile(file: File) {
    if (file.size > MAX_FILE_BYTES) return setRefused({ file: [tooLong(file.size)] });
    const data = new FormData();
    data.set('file', file);
    lookBy(() => lookAtFileAction(sectionId, data));
  }

  function bringIn(looked: LookedAt, choices: Record<string, RosterChoice>, leaveOutProblems: boolean) {
    const { roster, preview } = looked;
    const input = { sectionId, roster, choices, leaveOutProblems, seen: preview.seen };
    attempt(
      () => importRosterAction(input),
      (imported) => setStep({ at: 'done', imported }),
    );
  }

  return {
    step,
    kind,
    text,
    refused,
    pending,
    setKind,
    setText,
    lookAtFile,
    bringIn,
    lookAtText: (roster: RosterText) => lookBy(() => lookAtTextAction(sectionId, roster)),
    toText: () => {
      setRefused({});
      setStep({ at: 'text' });
    },
    startOver: () => {
      setText('');
      setStep({ at: 'text' });
    },
  };
}

export type RosterImportState = ReturnType<typeof useRosterImport>;
