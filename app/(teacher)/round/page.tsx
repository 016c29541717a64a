import type { Metadata } from 'next';
import { DeskPage } from '@/components/shell/desk-page';
import { EmptyState } from '@/components/ui/empty-state';
import { LinkButton } from '@/components/ui/link-button';
import { listRounds } from '@/lib/data/rounds/list-rounds';
import { pageActor, pageValue } from '@/lib/transport/page';
import { RoundList } from './_components/round-list';
import { Unsent } from './_components/unsent';

export const metadata: Metadata = { title: 'rounds' };

/** The rounds that can be walked today, and what this device has not sent yet. */
export default async function RoundsPage() {
  const actor = await pageActor();
  const rounds = pageValue(await listRounds(actor, {}));
  return (
    <DeskPage title="Rounds" note={rounds.length === 1 ? 'one sitting' : `${rounds.length} sittings`}>
      <Unsent personId={actor.personId} />
      {rounds.length > 0 ? (
        <RoundList rounds={rounds} />
      ) : (
        <EmptyState
          title="No round to walk today"
          action={
            actor.role === 'teacher' ? <LinkButton href="/practicals">practicals</LinkButton> : undefined
          }
        >
          {actor.role === 'aide'
            ? 'Rounds stand here on the days a teacher has given you a section.'
            : 'Give a practical to one of your sections: a round opens with it.'}
        </EmptyState>
      )}
    </DeskPage>
  );
}
