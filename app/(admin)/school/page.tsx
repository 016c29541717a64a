import type { Metadata } from 'next';
import { DeskPage } from '@/components/shell/desk-page';
import { sayDay } from '@/components/ui/days';
import { LinkButton } from '@/components/ui/link-button';
import { Heading } from '@/components/ui/titles';
import { readSchool } from '@/lib/data/school/read-school';
import { pageActor, pageValue } from '@/lib/transport/page';
import { NextSteps } from './_components/next-steps';

export const metadata: Metadata = { title: 'School' };

export default async function SchoolPage() {
  const school = pageValue(await readSchool(await pageActor(), {}));
  const term = school.currentTerm;
  const figures = [
    { label: 'teachers', value: school.teacherCount, href: '/school/people' },
    { label: 'students', value: school.studentCount, href: '/school/people?shown=students' },
    { label: 'sections', value: school.sectionCount, href: '/school/sections' },
    { label: 'departments', value: school.departmentCount, href: '/school/departments' },
  ];
  return (
    <DeskPage
      title={school.name}
      note={term ? `${term.name}, to ${sayDay(term.endsOn)}` : undefined}
      actions={
        <>
          <LinkButton href="/school/settings">change the school</LinkButton>
          <LinkButton kind="act" href="/school/people/invite">
            invite
          </LinkButton>
        </>
      }
      titleBlock={[
        { label: 'code that students type', value: school.code, wide: true },
        { label: 'lengths', value: school.unit === 'in' ? 'inches' : 'millimetres' },
        { label: 'clock', value: school.timeZone.replaceAll('_', ' ') },
      ]}
    >
      <NextSteps school={school} />
      <Heading className="mb-1 border-b border-ink pb-1">now</Heading>
      <dl className="grid grid-cols-2 gap-x-8 lg:grid-cols-4">
        {figures.map(({ label, value, href }) => (
          <div key={label} className="border-b border-hair py-3">
            <dt>
              <a className="link" href={href}>
                {label}
              </a>
            </dt>
            <dd className="tnum text-score">{value}</dd>
          </div>
        ))}
      </dl>
    </DeskPage>
  );
}
