'use client';

import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { typeAt } from '@/lib/practicals/draft-paths';
import { fieldName } from '@/lib/practicals/field-names';
import type { PlacedFinding } from '@/lib/practicals/place-findings';
import { NOTE_START, ROW } from './cut-list-layout';
import { fieldId, useEditor } from './editor-context';

/** What is wrong or worth seeing in a row, below it, hung from the field by a leader. */
export function RowNotes({ base, fields }: { base: string; fields: readonly string[] }) {
  const { errorsAt, findings } = useEditor();
  const notes = fields.flatMap((field) => {
    const path = `${base}.${field}`;
    const errors = errorsAt(path);
    const found = findings.filter((finding) => finding.path === path);
    return errors.length > 0 || found.length > 0 ? [{ field, path, errors, found }] : [];
  });
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

/** A finding with the press that settles it, where one does. */
export function FindingText({ path, text, setTo, isNote }: PlacedFinding) {
  const { desk } = useEditor();
  return (
    <p className={classNames('max-w-[72ch] text-label', isNote ? 'text-ink-2' : 'font-[520]')}>
      {text}{' '}
      {setTo === null ? null : (
        <Button
          kind="quiet"
          size="small"
          className="min-h-6 px-0 py-0"
          onClick={() => desk.edit((draft) => typeAt(draft, path, setTo))}
        >
          set it to the {setTo}
        </Button>
      )}
    </p>
  );
}
