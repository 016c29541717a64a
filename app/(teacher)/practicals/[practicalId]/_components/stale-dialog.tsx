'use client';

import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { LocalTime } from '@/components/ui/local-time';
import { draftDifferences } from '@/lib/practicals/field-names';
import type { DraftDesk } from './use-draft';

const MOST_ROWS = 12;

interface StaleDialogProps {
  desk: DraftDesk;
  /** Somebody looks at the sheet before choosing; the note beside the title leads back. */
  looking: boolean;
  onLook(): void;
}

/** Two drafts of one practical: what each says where they differ, and the choice between them. */
export function StaleDialog({ desk, looking, onLook }: StaleDialogProps) {
  if (desk.keep.kind !== 'stale') return null;
  const { there, message } = desk.keep;
  const differences = draftDifferences(desk.draft, there.content);
  return (
    <Dialog
      open={!looking}
      onOpenChange={(open) => {
        if (!open) onLook();
      }}
      title="Two drafts of this practical"
      description={`${message} This is where they differ.`}
      className="max-w-[46rem]"
      closeLabel="look first"
    >
      {differences.length === 0 ? (
        <p>Both say the same.</p>
      ) : (
        <Table caption="where the two drafts differ">
          <TableHead>
            <tr>
              <HeadCell>field</HeadCell>
              <HeadCell>typed here</HeadCell>
              <HeadCell>
                kept there <LocalTime at={there.at} />
              </HeadCell>
            </tr>
          </TableHead>
          <TableBody>
            {differences.slice(0, MOST_ROWS).map(({ path, name, here, there: other }) => (
              <tr key={path}>
                <RowHead>{name}</RowHead>
                <Cell className="max-w-48 truncate">{here || '–'}</Cell>
                <Cell className="max-w-48 truncate">{other || '–'}</Cell>
              </tr>
            ))}
          </TableBody>
        </Table>
      )}
      {differences.length > MOST_ROWS ? (
        <p className="mt-2 text-label text-ink-2">and {differences.length - MOST_ROWS} more</p>
      ) : null}
      <div className="mt-6 flex flex-wrap justify-end gap-2">
        <Button onClick={() => desk.takeThere(there)}>take the one kept there</Button>
        <Button kind="act" onClick={() => desk.keepHere(there)}>
          keep what is typed here
        </Button>
      </div>
    </Dialog>
  );
}
