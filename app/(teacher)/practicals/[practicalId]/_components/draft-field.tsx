'use client';

import type { ReactNode } from 'react';
import { NumberField } from '@/components/ui/number-field';
import { TextAreaField } from '@/components/ui/text-area-field';
import { TextField } from '@/components/ui/text-field';
import { textAt, typeAt } from '@/lib/practicals/draft-paths';
import { fieldId, useEditor } from './editor-context';
import { FindingText } from './finding-text';

interface DraftFieldProps {
  path: string;
  label: string;
  kind?: 'text' | 'number' | 'area';
  hint?: ReactNode;
  optional?: boolean;
  rows?: number;
  className?: string;
}

/** A field of the draft: keeps what is typed, says what cannot be used, and what the review found. */
export function DraftField({ path, kind = 'text', rows, ...rest }: DraftFieldProps) {
  const { desk, errorsAt, findings, setFocused } = useEditor();
  const found = findings.filter((each) => each.path === path);
  const shared = {
    ...rest,
    id: fieldId(path),
    value: textAt(desk.draft, path),
    error: errorsAt(path),
    finding:
      found.length > 0 ? found.map((finding) => <FindingText key={finding.code} {...finding} />) : undefined,
    onFocus: () => setFocused(path),
    onBlur: () => setFocused(null),
  };
  const type = (text: string) => desk.edit((draft) => typeAt(draft, path, text));
  if (kind === 'area') {
    return <TextAreaField {...shared} rows={rows} onChange={(event) => type(event.target.value)} />;
  }
  const Single = kind === 'number' ? NumberField : TextField;
  return <Single {...shared} onChange={(event) => type(event.target.value)} />;
}
