import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { type AccommodationRow, AccommodationTable } from '@/components/accommodation/accommodation-table';
import { ReadReasonPress } from '@/components/accommodation/read-reason-press';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { Heading } from '@/components/ui/titles';
import { listDepartmentAccommodations } from '@/lib/data/accommodations/list-department-accommodations';
import { pageValue } from '@/lib/transport/page';
import { readReasonAction } from './actions';

export const metadata: Metadata = { title: 'Modified rubrics' };

const sayPeriod = (period: string) => (/^period\b/i.test(period) ? period : `period ${period}`);

export default async function DepartmentModifiedPage() {
  const { sections, elsewhere } = pageValue(
    await listDepartmentAccommodations(await actorInRole('head'), {}),
  );
  const all = [...sections.flatMap(({ accommodations }) => accommodations), ...elsewhere];
  const standing = new Map(all.filter(({ ended }) => !ended).map((row) => [row.accommodationId, row]));
  return (
    <DeskPage
      title="Modified rubrics"
      titleBlock={[
        { label: 'sections', value: sections.length },
        { label: 'standing', value: standing.size },
        { label: 'students', value: new Set([...standing.values()].map(({ studentId }) => studentId)).size },
        { label: 'ended', value: new Set(all.map((row) => row.accommodationId)).size - standing.size },
      ]}
    >
      {all.length === 0 ? (
        <EmptyState title="No rubric is modified">
          Where a teacher of your department modifies the rubric for one student, it stands here. The teacher
          makes, changes and ends it.
        </EmptyState>
      ) : (
        <>
          <p className="mb-6 max-w-[70ch]">
            Made, changed and ended by the teacher of the section. You and that teacher see them, nobody else.
            Reading a reason is logged.
          </p>
          <div className="grid gap-10">
            {sections.map(({ sectionId, name, period, termName, accommodations }) => (
              <Rows
                key={sectionId}
                title={`${name}, ${sayPeriod(period)}`}
                note={termName}
                rows={accommodations}
              />
            ))}
            {elsewhere.length > 0 ? (
              <Rows title="In no section now" note="for the term, of students who left" rows={elsewhere} />
            ) : null}
          </div>
        </>
      )}
    </DeskPage>
  );
}

function Rows({ title, note, rows }: { title: string; note: string; rows: readonly AccommodationRow[] }) {
  return (
    <section>
      <div className="flex flex-wrap items-baseline gap-x-4">
        <Heading>{title}</Heading>
        <p className="text-label text-ink-2">{note}</p>
      </div>
      <AccommodationTable
        caption={`modified rubrics of ${title}`}
        rows={rows}
        acts={({ accommodationId, givenName, familyName }) => (
          <ReadReasonPress
            accommodationId={accommodationId}
            name={`${givenName} ${familyName}`.trim()}
            action={readReasonAction}
          />
        )}
      />
    </section>
  );
}
