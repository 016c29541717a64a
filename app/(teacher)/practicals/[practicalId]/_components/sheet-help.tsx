'use client';

import { Button } from '@/components/ui/button';
import { Popover } from '@/components/ui/popover';

const KEYS: [keys: string, does: string][] = [
  ['Tab', 'to the next cell'],
  ['Enter', 'down to where this row was begun; below the last row it adds a line'],
  ['arrow keys', 'from cell to cell; F2 first to walk inside a cell'],
  ['Escape', 'gives back what the cell held'],
  ['Ctrl Enter', 'adds a line below this one'],
  ['Alt Shift ↓', 'copies the line'],
  ['Alt ↑ ↓', 'moves the line; so does dragging its number'],
  ['Alt Delete', 'removes the line; Delete alone an empty one, or on its number'],
  ['Ctrl V', 'pastes rows of a spreadsheet from this cell on'],
  ['Ctrl Z', 'takes the last of these back'],
];

/** The keys of the sheet, one press away; the shortest of them are told with every row. */
export function SheetHelp() {
  return (
    <>
      <span id="sheet-keys" hidden>
        Alt with up or down moves the line, Alt Delete removes it, Alt Shift down copies it. It can be
        dragged.
      </span>
      <Popover
        label="keys of the sheet"
        align="end"
        trigger={
          <Button kind="quiet" size="small" className="ml-auto px-1 max-md:hidden">
            keys of the sheet
          </Button>
        }
      >
        <dl className="grid max-w-[34rem] grid-cols-[auto_minmax(0,1fr)] gap-x-4 gap-y-1 text-label">
          {KEYS.map(([keys, does]) => (
            <div key={keys} className="contents">
              <dt className="font-[640] whitespace-nowrap">{keys}</dt>
              <dd>{does}</dd>
            </div>
          ))}
        </dl>
        <p className="mt-2 text-small text-ink-2">On a Mac: Cmd for Ctrl, Option for Alt.</p>
      </Popover>
    </>
  );
}
