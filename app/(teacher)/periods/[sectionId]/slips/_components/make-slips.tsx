'use client';

import { useActionState } from 'react';
import { EmptyState } from '@/components/ui/empty-state';
import { Refusal } from '@/components/ui/refusal';
import { SubmitButton } from '@/components/ui/submit-button';
import type { RosterStudentView } from '@/lib/data/sections/read-roster';
import { sayName, sayStudents } from '../../../_components/words';
import { makeSlipsAction } from '../../actions';
import { Slips } from './slips';

interface MakeSlipsProps {
  sectionId: string;
  waiting: readonly RosterStudentView[];
  signInAt: string;
}

/** First words for all who have none: what will happen, then the slips, shown this once. */
export function MakeSlips({ sectionId, waiting, signInAt }: MakeSlipsProps) {
  const [reply, send] = useActionState(makeSlipsAction, undefined);
  if (reply && 'slips' in reply && reply.slips.slips.length > 0) {
    return <Slips view={reply.slips} signInAt={signInAt} />;
  }
  if (waiting.length === 0) {
    return (
      <EmptyState title="Everybody here has words">
        Whoever forgot theirs gets new ones at the bench: press the name on the roster.
      </EmptyState>
    );
  }
  return (
    <form action={send} className="grid max-w-[48rem] gap-4">
      <input type="hidden" name="sectionId" value={sectionId} />
      <p>
        A slip each for {sayStudents(waiting.length)} without a passphrase: ID, four words and where to sign
        in, to be printed and cut apart. Whoever has words keeps them.
      </p>
      <p>
        <strong>The words are shown once.</strong> They are kept nowhere, so have the printer ready. At the
        first sign-in each student chooses their own.
      </p>
      <ul
        aria-label="without a passphrase"
        className="gap-x-8 border-y border-hair py-3 sm:columns-2 md:columns-3"
      >
        {waiting.map((student) => (
          <li key={student.studentId} className="break-inside-avoid py-0.5">
            {sayName(student)}
          </li>
        ))}
      </ul>
      <div>
        <SubmitButton pendingLabel="making the words">make the slips</SubmitButton>
      </div>
      {reply && 'refused' in reply ? <Refusal title={reply.refused} /> : null}
    </form>
  );
}
