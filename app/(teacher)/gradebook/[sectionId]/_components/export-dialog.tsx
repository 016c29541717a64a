'use client';

import { useState } from 'react';
import { useSWRConfig } from 'swr';
import { Button } from '@/components/ui/button';
import { buttonClass } from '@/components/ui/button-style';
import { Dialog } from '@/components/ui/dialog';
import { SelectField } from '@/components/ui/select-field';
import type { GradebookView } from '@/lib/contracts/gradebook';
import { FilesSent } from './files-sent';

/** What goes to the registrar: grades or sizes of all published sittings or of one, and what went before. */
export function ExportDialog({ book }: { book: GradebookView }) {
  const [open, setOpen] = useState(false);
  if (!book.may.export) return null;
  if (book.sittings.every(({ publication }) => publication === null)) {
    return <Button notYet="Publish a sitting first: only published results go out.">export CSV</Button>;
  }
  return (
    <>
      <Button kind="act" onClick={() => setOpen(true)}>
        export CSV
      </Button>
      <Dialog open={open} onOpenChange={setOpen} title="Export" className="max-w-[44rem]">
        <div className="grid gap-4">
          <ExportLinks book={book} />
          <p className="max-w-[60ch] text-label text-ink-2">
            Only what is published goes out, as it was published. A student without a number goes out with a
            word and a blank. The same results always give the same file.
          </p>
          <FilesSent files={book.files} timeZone={book.timeZone} />
        </div>
      </Dialog>
    </>
  );
}

function ExportLinks({ book: { section, sittings } }: { book: GradebookView }) {
  const [sittingId, setSittingId] = useState('');
  const { mutate } = useSWRConfig();
  const published = sittings.filter(({ publication }) => publication !== null);
  const { sectionId } = section;
  const query = sittingId === '' ? '' : `?sitting=${sittingId}`;
  // The file is on its way when the press returns; the list of files follows a moment later.
  const lookAgain = () => setTimeout(() => void mutate(`/api/gradebook/${sectionId}`), 1500);
  const link = (file: string, kind: 'act' | 'plain', label: string) => (
    <a
      className={buttonClass({ kind })}
      href={`/api/exports/${sectionId}/${file}${query}`}
      download
      onClick={lookAgain}
    >
      {label}
    </a>
  );
  return (
    <>
      <SelectField
        label="sittings"
        value={sittingId}
        onChange={(event) => setSittingId(event.target.value)}
        options={[
          { value: '', label: `all published, ${published.length}` },
          ...published.map((sitting) => ({ value: sitting.sittingId, label: sitting.title })),
        ]}
      />
      <div className="flex flex-wrap gap-2">
        {link('grades.csv', 'act', 'grades, a row a student')}
        {link('sizes.csv', 'plain', 'sizes, a row a size')}
      </div>
    </>
  );
}
