import type { Metadata } from 'next';
import Link from 'next/link';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { Notice } from '@/components/ui/notice';
import { readMoveChoices } from '@/lib/data/sittings/read-move-choices';
import { readSitting, type SittingView } from '@/lib/data/sittings/read-sitting';
import { pageValue } from '@/lib/transport/page';
import { count, sayPeriod } from '../../_components/names';
import { ChangeDue } from './_components/change-due';
import { LatestMove } from './_components/latest-move';
import { StudentTable } from './_components/student-table';
import { sittingTitleBlock } from './_components/title-block-of';
import { VersionLink } from './_components/version-link';

export const metadata: Metadata = { title: 'Sitting' };

export default async function SittingPage({ params }: PageProps<'/sittings/[sittingId]'>) {
  const { sittingId } = await params;
  const actor = await actorInRole('teacher');
  const sitting = pageValue(await readSitting(actor, { sittingId }));
  const choices = pageValue(await readMoveChoices(actor, { sittingId }));
  const { title, sectionName, period, students, published } = sitting;
  return (
    <DeskPage
      title={title}
      note={`${sectionName}, ${sayPeriod(period)}`}
      tabs={
        <>
          <VersionLink choices={choices} />
          <ChangeDue sittingId={sittingId} dueOn={sitting.dueOn} today={sitting.today} />
        </>
      }
      actions={
        <>
          <LinkButton href={`/gradebook/${sitting.sectionId}`}>gradebook</LinkButton>
          <LinkButton kind={published ? 'plain' : 'act'} href={`/round/${sittingId}`}>
            to the bench
          </LinkButton>
          <LinkButton href={`/sittings/${sittingId}/publish`}>
            {published ? 'publish again' : 'publish'}
          </LinkButton>
        </>
      }
      titleBlock={sittingTitleBlock(sitting, choices)}
    >
      <div className="grid gap-6">
        <LatestMove choices={choices} />
        <Findings sitting={sitting} />
        {students.length === 0 ? (
          <EmptyState
            title="Nobody in this period yet"
            action={
              <LinkButton kind="act" href={`/periods/${sitting.sectionId}/import`}>
                paste names
              </LinkButton>
            }
          >
            Paste the names of {sayPeriod(period)}. Whoever is on its roster gets an attempt here.
          </EmptyState>
        ) : (
          <StudentTable sitting={sitting} />
        )}
      </div>
    </DeskPage>
  );
}

/** What a teacher should know before relying on the list. */
function Findings({ sitting: { sittingId, students, notArrived } }: { sitting: SittingView }) {
  const conflicts = students.reduce((sum, student) => sum + student.conflicts, 0);
  return (
    <>
      {conflicts > 0 ? (
        <Notice
          title={`${count(conflicts, 'size has', 'sizes have')} two readings.`}
          action={
            <Link className="link" href={`/round/${sittingId}`}>
              Choose at the bench
            </Link>
          }
        >
          Two people measured the same piece, and the readings differ. Both are kept until you choose.
        </Notice>
      ) : null}
      {notArrived.map(({ name, readings }) => (
        <Notice key={name} title={`${count(readings, 'reading', 'readings')} of ${name} not here yet.`}>
          A tablet has numbered them and still keeps them. They come by themselves when that person opens the
          round on it with a network.
        </Notice>
      ))}
    </>
  );
}
