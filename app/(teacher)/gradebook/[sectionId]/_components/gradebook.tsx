'use client';

import { useState } from 'react';
import { DeskPage } from '@/components/shell/desk-page';
import { Dialog } from '@/components/ui/dialog';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import type { GradebookCell, GradebookView } from '@/lib/contracts/gradebook';
import { count, sayPeriod, spokenName } from '../../../_components/names';
import { ClassPicture } from './class-picture';
import { Explanation } from './explanation';
import { ExportDialog } from './export-dialog';
import { GradebookTable, type Selection } from './gradebook-table';
import { Legend } from './legend';
import { PeriodLinks } from './period-links';
import { gradebookTitleBlock } from './title-block-of';
import { useGradebook } from './use-gradebook';

/** From this width on the explanation stands beside the table; below it opens over it. */
const BESIDE = '(min-width: 1280px)';

/** The cell that is open, beside the table or over it. */
function useOpenCell({ students, sittings }: GradebookView) {
  const [selection, setSelection] = useState<Selection | null>(null);
  const [over, setOver] = useState(false);
  const student = students.find(({ studentId }) => studentId === selection?.studentId);
  const index = sittings.findIndex(({ sittingId }) => sittingId === selection?.sittingId);
  function select(next: Selection) {
    setSelection(next);
    if (!window.matchMedia(BESIDE).matches) setOver(true);
  }
  return { selection, select, over, setOver, student, index, cell: student?.cells[index] ?? null };
}

/** A section's gradebook: students down, practicals across, and beside it where the points of one cell went. */
export function Gradebook({ first }: { first: GradebookView }) {
  const { book, late } = useGradebook(first);
  const { selection, select, over, setOver, student, index, cell } = useOpenCell(book);
  const { section, sittings, students } = book;
  return (
    <DeskPage
      title={capital(sayPeriod(section.period))}
      note={`${section.name}, ${count(section.studentCount, 'student', 'students')}, ${section.termName}`}
      tabs={<PeriodLinks book={book} />}
      actions={<ExportDialog book={book} />}
      titleBlock={gradebookTitleBlock(book, late)}
      aside={sittings.length > 0 ? <Beside book={book} index={index} cell={cell} /> : undefined}
    >
      {sittings.length === 0 || students.length === 0 ? (
        <NothingYet book={book} />
      ) : (
        <>
          <GradebookTable book={book} selection={selection} onSelect={select} />
          <Legend />
        </>
      )}
      <Dialog
        open={over && cell !== null}
        onOpenChange={setOver}
        title={student ? spokenName(student) : ''}
        className="max-w-[40rem]"
      >
        {cell ? <Explanation book={book} cell={cell} inDialog /> : null}
      </Dialog>
    </DeskPage>
  );
}

interface BesideProps {
  book: GradebookView;
  index: number;
  cell: GradebookCell | null;
}

function Beside({ book, index, cell }: BesideProps) {
  return (
    <div className="grid gap-8">
      <div className="max-xl:hidden">
        {cell ? (
          <Explanation book={book} cell={cell} />
        ) : (
          <p className="text-ink-2">Choose a cell to see where its points went.</p>
        )}
      </div>
      <ClassPicture book={book} index={index} cell={cell} />
    </div>
  );
}

function NothingYet({ book: { section, students, may } }: { book: GradebookView }) {
  if (students.length === 0) {
    return (
      <EmptyState
        title="No students yet"
        action={
          may.change ? (
            <LinkButton kind="act" href={`/periods/${section.sectionId}/import`}>
              paste names
            </LinkButton>
          ) : undefined
        }
      >
        Students stand here down the side, practicals across the top.
      </EmptyState>
    );
  }
  return (
    <EmptyState
      title="No practical given yet"
      action={
        may.change ? (
          <LinkButton kind="act" href={`/sittings/new?section=${section.sectionId}`}>
            give a practical
          </LinkButton>
        ) : undefined
      }
    >
      {count(students.length, 'student stands', 'students stand')} ready. Give the period a practical: it gets
      a column here, and fills while you walk the round.
    </EmptyState>
  );
}

function capital(text: string): string {
  return text.charAt(0).toUpperCase() + text.slice(1);
}
