'use client';

import { useActionState } from 'react';
import { Refusal } from '@/components/ui/refusal';
import { SubmitButton } from '@/components/ui/submit-button';
import { giveWordsAction } from '../actions';

/** Gives a student new words and shows them, this once. */
export function GiveWords({ studentId, first }: { studentId: string; first: boolean }) {
  const [reply, send] = useActionState(giveWordsAction, undefined);
  if (reply && 'slip' in reply) {
    const { words, localId } = reply.slip;
    return (
      <div role="status">
        <p>
          With the ID <strong>{localId}</strong> and these words, once; then they choose their own.
        </p>
        <ol
          aria-label="the new words"
          className="mt-2 grid gap-1 border-y-outline border-ink bg-plate px-4 py-3 text-key"
        >
          {words.split(' ').map((word) => (
            <li key={word}>{word}</li>
          ))}
        </ol>
        <p className="mt-2 text-label text-ink-2">Write them down now: they are not shown again.</p>
      </div>
    );
  }
  return (
    <form action={send} className="grid gap-2">
      <input type="hidden" name="studentId" value={studentId} />
      <p>
        {first
          ? 'This student cannot sign in yet: no words have been given out.'
          : 'Words forgotten, or seen by others? New ones end the old ones at once, and sign the student out.'}
      </p>
      <div>
        <SubmitButton kind="plain">give {first ? 'first' : 'new'} words</SubmitButton>
      </div>
      {reply && 'refused' in reply ? <Refusal title={reply.refused} /> : null}
    </form>
  );
}
