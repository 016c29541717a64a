'use client';

import { Button } from '@/components/ui/button';
import { fieldName } from '@/lib/practicals/field-names';
import { MOST_LINES } from '@/lib/practicals/parse-draft';
import { useEditor } from './editor-context';
import { focusCell, type SheetDesk } from './sheet-desk';

const MOST_NAMED = 12;
const SHORT_LIST = 12;

/** What of a long list cannot be read yet, each with the way to it, and what there is too much of. */
export function RowsToMend({ sheet }: { sheet: SheetDesk }) {
  const { settled, parsed, errorsAt } = useEditor();
  const paths = Object.keys(parsed.ok ? {} : parsed.errors).filter((path) => errorsAt(path).length > 0);
  const fields = paths.flatMap((path) => {
    const [, row, column] = /^lines\.(\d+)\.(\w+)$/.exec(path) ?? [];
    return row !== undefined && column !== undefined ? [{ path, row: Number(row), column }] : [];
  });
  const rows = new Set(fields.map(({ row }) => row)).size;
  const { length } = settled.lines;
  const told = errorsAt('lines');
  if (told.length === 0 && (fields.length === 0 || (rows < 2 && length <= SHORT_LIST))) return null;
  return (
    <section
      aria-label="to mend in the cut list"
      className="mb-3 border-l-edge border-refuse pl-3 text-label"
    >
      {told.map((error) => (
        <p key={error} role="alert" className="font-[580] text-refuse">
          {error}{' '}
          {length > MOST_LINES ? (
            <Button
              kind="quiet"
              size="small"
              className="min-h-6 px-1 py-0"
              onClick={() => sheet.removeRest()}
            >
              remove lines {MOST_LINES + 1} to {length}
            </Button>
          ) : null}
        </p>
      ))}
      {rows > 0 ? (
        <p>
          <strong className="font-[640] text-refuse">
            {rows} of {length} {length === 1 ? 'line' : 'lines'} cannot be read yet:
          </strong>{' '}
          {fields.slice(0, MOST_NAMED).map(({ path, row, column }, index) => (
            <span key={path}>
              {index > 0 ? ' · ' : null}
              <a
                href={`#line-${row + 1}`}
                className="link inline-block min-h-6 leading-6"
                onClick={(event) => {
                  event.preventDefault();
                  focusCell(row, column);
                }}
              >
                {fieldName(path)}
              </a>
            </span>
          ))}
          {fields.length > MOST_NAMED ? ` and ${fields.length - MOST_NAMED} more` : null}
        </p>
      ) : null}
    </section>
  );
}
