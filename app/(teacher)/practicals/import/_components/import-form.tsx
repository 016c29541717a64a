'use client';

import { useActionState, useEffect, useRef } from 'react';
import { FileField } from '@/components/ui/file-field';
import { Refusal } from '@/components/ui/refusal';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextAreaField } from '@/components/ui/text-area-field';
import { importPracticalAction } from '../actions';
import { ProblemTable } from './problem-table';

/** A practical from a file or from what it says; what was read stays, so that it can be put right here. */
export function ImportForm() {
  const [reply, send] = useActionState(importPracticalAction, null);
  const top = useRef<HTMLDivElement>(null);
  useEffect(() => {
    if (reply) top.current?.focus();
  }, [reply]);
  const error = (at: 'file' | 'text') =>
    reply?.kind === 'refused' && reply.at === at ? reply.message : undefined;
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-8">
      <div ref={top} tabIndex={-1} className="outline-none empty:hidden">
        {reply?.kind === 'problems' ? <ProblemTable {...reply} /> : null}
        {reply?.kind === 'refused' && reply.at === null ? <Refusal title={reply.message} /> : null}
      </div>
      <form action={send} className="grid max-w-[64rem] gap-5">
        <FileField
          label="file"
          name="file"
          accept=".json,application/json"
          hint="It ends in .practical.json; up to 1 MB."
          error={error('file')}
          className="max-w-[32rem]"
        />
        <TextAreaField
          key={reply?.text ?? ''}
          label={
            reply?.kind === 'problems'
              ? 'what it says: put it right here, or in the file'
              : 'or what it says, pasted'
          }
          name="text"
          rows={reply?.kind === 'problems' ? 18 : 8}
          spellCheck={false}
          autoComplete="off"
          defaultValue={reply?.text}
          hint="A chosen file goes before what stands here."
          error={error('text')}
        />
        <div>
          <SubmitButton pendingLabel="reading it …">make the practical</SubmitButton>
        </div>
      </form>
    </div>
  );
}
