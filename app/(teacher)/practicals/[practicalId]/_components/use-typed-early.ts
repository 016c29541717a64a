'use client';

import { useEffect, useState } from 'react';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { textAt, typeAt } from '@/lib/practicals/draft-paths';
import { fieldId } from './editor-context';
import type { DraftDesk } from './use-draft';

const STEM = fieldId('');

/** Takes up what was typed into the page before it came to life; `drawn` is what the server drew into the fields. */
export function useTypedEarly({ edit }: DraftDesk, drawn: PracticalDraft): void {
  const [first] = useState(drawn);
  useEffect(() => {
    const fields = document.querySelectorAll<HTMLInputElement | HTMLTextAreaElement>(
      `input[id^="${STEM}"], textarea[id^="${STEM}"]`,
    );
    const typed = [...fields].flatMap((field) => {
      const path = field.id.slice(STEM.length).replaceAll('-', '.');
      return asDrawn(field, textAt(first, path)) === field.value ? [] : [{ path, value: field.value }];
    });
    if (typed.length === 0) return;
    edit((draft) => {
      for (const { path, value } of typed) typeAt(draft, path, value);
    });
  }, [edit, first]);
}

/** A field shows line ends its own way. */
function asDrawn(field: HTMLInputElement | HTMLTextAreaElement, text: string): string {
  return text.replace(/\r\n?|\n/g, field instanceof HTMLTextAreaElement ? '\n' : '');
}
