'use client';

import { useActionState } from 'react';
import { Refusal } from '@/components/ui/refusal';
import { SubmitButton } from '@/components/ui/submit-button';
import { newWordsAction } from '../../../actions';

/** New words at the bench: large enough to be read from where the student stands, and shown this once. */
export function NewWords({ studentId, first }: { studentId: string; first: boolean }) {
  const [reply, send] = useActionState(newWordsAction, undefined);
  if (reply && 'slip' in reply) return <Words words={reply.slip.words} localId={reply.slip.localId} />;
  return (
    <form action={send} className="grid gap-3">
      <input type="hidden" name="studentId" value={studentId} />
      <p>
        {first
          ? 'No words have been given out yet, so this student cannot sign in.'
          : 'Words forgotten, or seen by others? New ones end the old ones at once and sign the student out everywhere. No reading is lost.'}
      </p>
      <div>
        <SubmitButton kind="plain" pendingLabel="making words">
          {first ? 'make words' : 'make new words'}
        </SubmitButton>
      </div>
      {reply && 'refused' in reply ? <Refusal title={reply.refused} /> : null}
    </form>
  );
}

function Words({ words, localId }: { words: string; localId: string }) {
  return (
    <div role="status">
      <p>
        Sign in with the ID <strong>{localId}</strong> and these words:
      </p>
      <ol
        aria-label="the new words"
        className="my-3 border-y-edge border-ink bg-plate px-4 py-4 font-title text-[2.5rem] leading-[1.25] font-[620]"
      >
        {words.split(' ').map((word) => (
          <li key={word}>{word}</li>
        ))}
      </ol>
      <p>
        Shown this once. Let the student write them down before you leave this sheet; at the first sign-in
        they choose their own.
      </p>
    </div>
  );
}
