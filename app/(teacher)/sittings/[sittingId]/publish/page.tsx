import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { LinkButton } from '@/components/ui/link-button';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { pageValue } from '@/lib/transport/page';
import { sayPeriod } from '../../../_components/names';
import { OutcomeTable } from './_components/outcome-table';
import { PublishForm } from './_components/publish-form';
import { VersionNotice } from './_components/version-notice';
import { readVersionSince } from './_components/version-since';

export const metadata: Metadata = { title: 'Publish' };

export default async function PublishPage({ params }: PageProps<'/sittings/[sittingId]/publish'>) {
  const { sittingId } = await params;
  const actor = await actorInRole('teacher');
  const preview = pageValue(await previewPublication(actor, { sittingId }));
  const since = await readVersionSince(actor, preview);
  const { title, sectionName, period, versionNumber, number } = preview;
  return (
    <DeskPage
      title={`Publish ${title}`}
      note={`${sectionName}, ${sayPeriod(period)}, version ${versionNumber}`}
      actions={<LinkButton href={`/sittings/${sittingId}`}>back to the sitting</LinkButton>}
      titleBlock={[
        { label: 'publication', value: number === 1 ? 'the first' : `number ${number}` },
        {
          label: 'differs',
          value: since
            ? 'in the version'
            : preview.changed === null
              ? 'nothing is out yet'
              : sayChanged(preview.changed),
        },
      ]}
    >
      {since ? <VersionNotice since={since} /> : null}
      <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,1fr)_24rem]">
        <OutcomeTable preview={preview} />
        <PublishForm preview={preview} />
      </div>
    </DeskPage>
  );
}

function sayChanged(changed: number): string {
  if (changed === 0) return 'in nothing';
  return changed === 1 ? 'in 1 result' : `in ${changed} results`;
}
