import { Heading } from '@/components/ui/titles';
import type { PersonView } from '@/lib/data/school/person-view';
import { GiveWords } from './give-words';
import { Press } from './press';

/** What an admin can do about a person besides the roles. */
export function PersonActs({ person }: { person: PersonView }) {
  const { personId, state, isSelf, email, roles } = person;
  const waits = state === 'invited' || state === 'invitation ended';
  const isStudentAlone = roles.every((role) => role === 'student');
  if (isSelf) return null;
  return (
    <section className="grid gap-6">
      <Heading className="border-b border-ink pb-1">{state === 'left' ? 'has left' : 'access'}</Heading>
      {waits && email ? (
        <div className="grid gap-2">
          <p>
            {state === 'invited'
              ? 'The link was mailed and has not been used yet.'
              : 'The link has ended without being used.'}
          </p>
          <Press what="resend" personId={personId} />
        </div>
      ) : null}
      {isStudentAlone && state !== 'left' ? (
        <GiveWords studentId={personId} first={state === 'no passphrase'} />
      ) : null}
      {state === 'left' ? (
        <div className="grid gap-2">
          <p>Cannot sign in. All that was recorded is kept; brought back, the same password works again.</p>
          <Press what="back" personId={personId} />
        </div>
      ) : (
        <div className="grid gap-2">
          <p>
            Whoever is marked as left can no longer sign in. All that was recorded stays, and this can be
            undone.
          </p>
          <Press what="left" personId={personId} />
        </div>
      )}
    </section>
  );
}
