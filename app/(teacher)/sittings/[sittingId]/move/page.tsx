import type { Metadata } from 'next';
import { actorInRole } from '@/app/account/_components/actor-in-role';
import { DeskPage } from '@/components/shell/desk-page';
import { sayDayOf } from '@/components/ui/days';
import { LinkButton } from '@/components/ui/link-button';
import { readMoveChoices } from '@/lib/data/sittings/read-move-choices';
import { pageValue } from '@/lib/transport/page';
import { sayPeriod } from '../../../_components/names';
import { ChosenVersion } from './_components/chosen-version';
import { MoveBoard } from './_components/move-board';
import { MoveHistory } from './_components/move-history';
import { VersionList } from './_components/version-list';

export const metadata: Metadata = { title: 'Move to another version' };

export default async function MovePage({ params, searchParams }: PageProps<'/sittings/[sittingId]/move'>) {
  const { sittingId } = await params;
  const { version: wanted } = await searchParams;
  const choices = pageValue(await readMoveChoices(await actorInRole('teacher'), { sittingId }));
  const { others, version, timeZone } = choices;
  const [only] = others.length === 1 ? others : [];
  const chosen = wanted === undefined ? only : others.find(({ versionId }) => versionId === wanted);
  const history = <MoveHistory choices={choices} />;
  return (
    <DeskPage
      title={`Move ${choices.title}`}
      note={`${choices.sectionName}, ${sayPeriod(choices.period)}, now on version ${version.number}`}
      actions={<LinkButton href={`/sittings/${sittingId}`}>back to the sitting</LinkButton>}
      titleBlock={[
        { label: 'stands on', value: `version ${version.number}` },
        { label: 'published', value: sayDayOf(version.publishedAt, timeZone) },
      ]}
    >
      {chosen ? (
        <MoveBoard
          key={`${version.versionId} ${chosen.versionId}`}
          sittingId={sittingId}
          versionId={chosen.versionId}
          toNumber={chosen.number}
          published={choices.published}
          head={<ChosenVersion choices={choices} chosen={chosen} />}
          history={history}
        />
      ) : (
        <div className="grid items-start gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,1fr)_20rem]">
          <VersionList choices={choices} unknown={wanted !== undefined} />
          {history}
        </div>
      )}
    </DeskPage>
  );
}
