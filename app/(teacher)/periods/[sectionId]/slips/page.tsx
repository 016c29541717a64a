import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { readSectionRoster } from '@/lib/data/sections/read-roster';
import { env } from '@/lib/env';
import { pageValue } from '@/lib/transport/page';
import { saySection } from '../../_components/words';
import { waitsForSlip } from '../_components/roster-words';
import { MakeSlips } from './_components/make-slips';

export const metadata: Metadata = { title: 'Slips' };

interface SlipsPageProps {
  params: Promise<{ sectionId: string }>;
}

export default async function SlipsPage({ params }: SlipsPageProps) {
  const { sectionId } = await params;
  const section = pageValue(await readSectionRoster(await actorInRole('teacher'), { sectionId }));
  const waiting = section.students.filter((student) => student.here && waitsForSlip(student));
  const signInAt = `${env().APP_URL.replace(/^https:\/\//, '')}/sign-in`;
  return (
    <div className="flex flex-1 flex-col print:block print:[&_h1]:hidden">
      <DeskPage
        title="Slips"
        note={<span className="print:hidden">{saySection(section)}</span>}
        actions={<LinkButton href={`/periods/${sectionId}`}>the roster</LinkButton>}
      >
        <MakeSlips sectionId={sectionId} waiting={waiting} signInAt={signInAt} />
      </DeskPage>
    </div>
  );
}
