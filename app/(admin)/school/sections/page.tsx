import type { Metadata } from 'next';
import { DeskPage } from '@/components/shell/desk-page';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { listAllSections, type SectionOverviewView } from '@/lib/data/school/list-all-sections';
import { pageActor, pageValue } from '@/lib/transport/page';

export const metadata: Metadata = { title: 'Sections' };

export default async function SectionsPage() {
  const sections = pageValue(await listAllSections(await pageActor(), {}));
  return (
    <DeskPage title="Sections" note={sections.length > 0 ? `${sections.length} in use` : undefined}>
      {sections.length === 0 ? (
        <EmptyState
          title="No sections yet"
          action={
            <LinkButton kind="act" href="/school/people/invite">
              invite a teacher
            </LinkButton>
          }
        >
          Each teacher makes their own sections under “periods” and brings in the roster there.
        </EmptyState>
      ) : (
        <SectionTable sections={sections} />
      )}
    </DeskPage>
  );
}

function SectionTable({ sections }: { sections: SectionOverviewView[] }) {
  return (
    <Table caption="sections of the school">
      <TableHead>
        <tr>
          <HeadCell>section</HeadCell>
          <HeadCell>period</HeadCell>
          <HeadCell>term</HeadCell>
          <HeadCell>teacher</HeadCell>
          <HeadCell>department</HeadCell>
          <HeadCell align="right">students</HeadCell>
          <HeadCell align="right">practicals</HeadCell>
        </tr>
      </TableHead>
      <TableBody fives>
        {sections.map((section) => (
          <tr key={section.sectionId}>
            <RowHead>{section.name}</RowHead>
            <Cell>{section.period}</Cell>
            <Cell>{section.termName}</Cell>
            <Cell>{section.teachers.join(', ')}</Cell>
            <Cell>{section.departmentName}</Cell>
            <Cell align="right">{section.studentCount}</Cell>
            <Cell align="right">{section.sittingCount}</Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
