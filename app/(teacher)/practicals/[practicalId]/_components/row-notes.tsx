'use client';

import { classNames } from '@/components/ui/class-names';
import { fieldName } from '@/lib/practicals/field-names';
import type { PlacedFinding } from '@/lib/practicals/place-findings';
import { NOTE_START, ROW } from './cut-list-layout';
import { fieldId, useEditor } from './editor-context';
import { FindingText } from './finding-text';
import type { RowNote } from './row-props';

/** What is wrong or worth seeing in a row outside the lines, hung below it. */
export function RowNotes({ base, fields }: { base: string; fields: readonly string[] }) {
  const { errorsAt, findings } = useEditor();
  return <NotesBelow notes={notesOf(base, fields, errorsAt, findings)} />;
}

export function notesOf(
  base: string,
  fields: readonly string[],
  errorsAt: (path: string) => string[],
  findings: readonly PlacedFinding[],
): RowNote[] {
  return fields.flatMap((field) => {
    const path = `${base}.${field}`;
    const errors = errorsAt(path);
    const found = findings.filter((finding) => finding.path === path);
    return errors.length > 0 || found.length > 0 ? [{ field, path, errors, found }] : [];
  });
}

/** Notes below a row, each hung from its field by a leader. */
export function NotesBelow({ notes }: { notes: readonly RowNote[] }) {
  if (notes.length === 0) return null;
  return (
    <tr className={classNames(ROW, 'border-b border-hair pb-3')}>
      {notes.map(({ field, path, errors, found }) => (
        <td
          key={field}
          id={`${fieldId(path)}-note`}
          className={classNames('relative col-span-6 pl-6 lg:col-end-[-1]', NOTE_START[field])}
        >
          <span aria-hidden className="absolute -top-2 left-2 h-5 w-3 border-b border-l border-ink" />
          <span aria-hidden className="absolute -top-3 left-[5px] size-[7px] rounded-[50%] bg-ink" />
          {errors.map((error) => (
            <p key={error} className="text-label font-[580] text-refuse">
              <span className="lg:sr-only">{fieldName(path)}: </span>
              {error}
            </p>
          ))}
          {errors.length === 0
            ? found.map((finding) => <FindingText key={finding.code} {...finding} />)
            : null}
        </td>
      ))}
    </tr>
  );
}
