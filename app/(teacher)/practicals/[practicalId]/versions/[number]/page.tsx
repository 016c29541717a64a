import type { Metadata } from 'next';
import { notFound } from 'next/navigation';
import { PressForm } from '@/app/(teacher)/practicals/_components/press-form';
import { copyPracticalAction } from '@/app/(teacher)/practicals/actions';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { FileLink } from '@/components/version/file-link';
import { VersionSheet } from '@/components/version/version-sheet';
import { versionTitleBlock } from '@/components/version/version-title-block';
import { readVersionSheet } from '@/lib/data/practicals/read-version-sheet';
import { draftOf } from '@/lib/practicals/draft-of';
import { type DraftDifference, draftDifferences } from '@/lib/practicals/field-names';
import { pageValue } from '@/lib/transport/page';
import { TakeBack } from '../_components/take-back';
import { VersionAside } from '../_components/version-aside';

interface VersionPageProps {
  params: Promise<{ practicalId: string; number: string }>;
}

export const metadata: Metadata = { title: 'A version' };

export default async function VersionPage({ params }: VersionPageProps) {
  const { practicalId, number } = await params;
  if (!/^\d{1,6}$/.test(number)) notFound();
  const asked = { practicalId, number: Number(number) };
  const view = pageValue(await readVersionSheet(await actorInRole('teacher'), asked));
  const { task, form, draft, versionId } = view;
  return (
    <DeskPage
      title={`${task.title}, version ${view.number}`}
      wideHead
      actions={
        <>
          <FileLink practicalId={practicalId} version={view.number} />
          {view.mayCopy ? (
            <PressForm
              action={copyPracticalAction}
              fields={{ practicalId, versionId }}
              label="copy into a new practical"
              size="desk"
            />
          ) : null}
          {draft ? (
            <TakeBack
              key={versionId}
              {...{ practicalId, draft }}
              number={view.number}
              differences={draftDifferences(draft.content, draftOf(task, form)).filter(isSeen)}
            />
          ) : null}
        </>
      }
      aside={<VersionAside view={view} />}
      titleBlock={versionTitleBlock(view)}
    >
      <VersionSheet {...view} />
    </DeskPage>
  );
}

/** How the editor shows a price, and which preset was pressed, is nothing that a draft says. */
function isSeen({ path }: DraftDifference): boolean {
  return !path.endsWith('.mirrored') && !path.startsWith('presets');
}
