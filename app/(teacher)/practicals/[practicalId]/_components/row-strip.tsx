'use client';

import { Button } from '@/components/ui/button';
import type { SheetDesk } from './sheet-desk';

interface RowStripProps {
  index: number;
  name: string;
  isFirst: boolean;
  isLast: boolean;
  sheet: SheetDesk;
}

/** What can be done with the row in hand, for a finger and for who has not learnt the keys yet. */
export function RowStrip({ index, name, isFirst, isLast, sheet }: RowStripProps) {
  const key = { kind: 'quiet', size: 'small', className: 'min-h-7 px-1.5 py-0' } as const;
  return (
    <span className="flex flex-wrap items-center gap-x-2 lg:justify-end">
      <Button {...key} aria-label={`copy line ${index + 1}, ${name}`} onClick={() => sheet.copy(index)}>
        copy
      </Button>
      <Button
        {...key}
        aria-label={`move line ${index + 1}, ${name}, up`}
        notYet={isFirst ? 'it is the first line' : null}
        onClick={() => sheet.move(index, index - 1, null)}
      >
        up
      </Button>
      <Button
        {...key}
        aria-label={`move line ${index + 1}, ${name}, down`}
        notYet={isLast ? 'it is the last line' : null}
        onClick={() => sheet.move(index, index + 1, null)}
      >
        down
      </Button>
      <Button {...key} aria-label={`remove line ${index + 1}, ${name}`} onClick={() => sheet.remove(index)}>
        remove
      </Button>
    </span>
  );
}
