import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { sayDay } from '@/components/ui/days';
import { LinkButton } from '@/components/ui/link-button';
import { Heading } from '@/components/ui/titles';
import { readSectionRoster } from '@/lib/data/sections/read-roster';
import { pageValue } from '@/lib/transport/page';
import { saySection } from '../../../_components/words';
import { PASSPHRASE_WORDS } from '../../_components/roster-words';
import { InSection } from './_components/in-section';
import { NewWords } from './_components/new-words';

export const metadata: Metadata = { title: 'Student' };

interface StudentPageProps {
  params: Promise<{ sectionId: string; studentId: string }>;
}

export default async function StudentPage({ params }: StudentPageProps) {
  const { sectionId, studentId } = await params;
  const section = pageValue(await readSectionRoster(await actorInRole('teacher'), { sectionId }));
  const student = section.students.find((each) => each.studentId === studentId) ?? notFound();
  const { givenName, familyName, localId, joinedOn, leftOn, passphrase, isStaff } = student;
  return (
    <DeskPage
      title={[givenName, familyName].filter(Boolean).join(' ')}
      note={saySection(section)}
      actions={<LinkButton href={`/periods/${sectionId}`}>the roster</LinkButton>}
      titleBlock={[
        { label: 'ID', value: localId ?? 'none' },
        { label: 'passphrase', value: isStaff ? 'works here' : PASSPHRASE_WORDS[passphrase] },
        { label: 'since', value: sayDay(joinedOn) },
        { label: 'left', value: leftOn ? sayDay(leftOn) : 'no' },
      ]}
    >
      <div className="grid max-w-[58rem] gap-x-12 gap-y-8 md:grid-cols-2">
        <section>
          <Heading className="mb-3 border-b border-ink pb-1">passphrase</Heading>
          {isStaff ? (
            <p>Works here too, and resets the password by email.</p>
          ) : (
            <NewWords studentId={studentId} first={passphrase === 'none'} />
          )}
        </section>
        <section>
          <Heading className="mb-3 border-b border-ink pb-1">in this section</Heading>
          <InSection sectionId={sectionId} student={student} today={section.today} />
        </section>
      </div>
    </DeskPage>
  );
}
