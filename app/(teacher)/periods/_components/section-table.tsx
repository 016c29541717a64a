import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import type { SectionListView } from '@/lib/data/sections/list-sections';
import { saySection } from './words';

interface SectionTableProps {
  caption: string;
  sections: readonly SectionListView[];
  withTerm?: boolean;
}

export function SectionTable({ caption, sections, withTerm = false }: SectionTableProps) {
  return (
    <Table caption={caption} className="max-w-[58rem]">
      <TableHead>
        <tr>
          <HeadCell className="w-[1%] pr-4 md:pr-8">period</HeadCell>
          <HeadCell>section</HeadCell>
          {withTerm ? <HeadCell className="max-sm:hidden">term</HeadCell> : null}
          <HeadCell align="right">students</HeadCell>
          <HeadCell className="md:pl-12">sittings</HeadCell>
          <HeadCell className="max-sm:hidden">
            <span className="sr-only">gradebook</span>
          </HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {sections.map((section) => (
          <SectionRow key={section.sectionId} section={section} withTerm={withTerm} />
        ))}
      </TableBody>
    </Table>
  );
}

function SectionRow({ section, withTerm }: { section: SectionListView; withTerm: boolean }) {
  const { sectionId, name, period, termName, studentCount } = section;
  return (
    <tr>
      <Cell className="pr-4 font-title text-title whitespace-nowrap md:pr-8">{period}</Cell>
      <RowHead className="text-lead">
        <Link
          className="link inline-block py-1"
          href={`/periods/${sectionId}`}
          aria-label={saySection(section)}
        >
          {name}
        </Link>
        {withTerm ? <p className="text-label font-[480] text-ink-2 sm:hidden">{termName}</p> : null}
      </RowHead>
      {withTerm ? <Cell className="max-sm:hidden">{termName}</Cell> : null}
      <Cell align="right">
        {studentCount === 0 ? (
          <Link
            className="link"
            href={`/periods/${sectionId}/import`}
            aria-label={`paste names for ${saySection(section)}`}
          >
            paste names
          </Link>
        ) : (
          studentCount
        )}
      </Cell>
      <Cell className="md:pl-12">
        <Sittings section={section} />
        <span className="mt-1 block sm:hidden">
          <GradebookLink section={section} />
        </span>
      </Cell>
      <Cell align="right" className="max-sm:hidden">
        <GradebookLink section={section} />
      </Cell>
    </tr>
  );
}

function Sittings({ section }: { section: SectionListView }) {
  const { sectionId, sittings, openSittings, termWhen } = section;
  const where = saySection(section);
  if (openSittings > 0) {
    return (
      <Link className="link" href="/sittings" aria-label={`${openSittings} sittings open in ${where}`}>
        {openSittings} open
      </Link>
    );
  }
  if (termWhen === 'past') return sittings === 0 ? 'none' : `${sittings} given`;
  return (
    <Link
      className="link"
      href={`/sittings/new?section=${sectionId}`}
      aria-label={`give a practical to ${where}`}
    >
      give a practical
    </Link>
  );
}

function GradebookLink({ section }: { section: SectionListView }) {
  return (
    <Link
      className="link"
      href={`/gradebook/${section.sectionId}`}
      aria-label={`gradebook of ${saySection(section)}`}
    >
      gradebook
    </Link>
  );
}
