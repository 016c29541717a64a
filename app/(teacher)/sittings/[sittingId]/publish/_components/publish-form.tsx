'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { CheckboxField } from '@/components/ui/choice';
import { Notice } from '@/components/ui/notice';
import { SubmitButton } from '@/components/ui/submit-button';
import type { PublicationPreview } from '@/lib/data/sittings/preview-publication';
import { count } from '../../../../_components/names';
import { publishAction } from '../../../actions';
import { LateLocks } from './late-locks';

/** The teacher's word on what is still open, and the one press that tells the class. */
export function PublishForm({ preview }: { preview: PublicationPreview }) {
  const [reply, action] = useActionState(publishAction, undefined);
  const { sittingId, seen, number, changed, conflicts, unread, incomplete, late } = preview;
  const without = unread.length + incomplete.length;
  const errors = reply?.error ?? {};
  if (conflicts.length > 0) return <Conflicts preview={preview} />;
  return (
    <form action={action} className="grid gap-5">
      <input type="hidden" name="sittingId" value={sittingId} />
      <input type="hidden" name="seen" value={seen} />
      <FormRefusal errors={errors[''] ?? errors.seen ?? undefined} />
      {without > 0 ? (
        <CheckboxField
          name="withoutUnread"
          defaultChecked={reply?.initialValue?.withoutUnread === 'on'}
          label={`publish without ${count(without, 'student', 'students')} not read to the end`}
          hint="They go out as “not read”, without a number. Read them later and publish again."
          error={errors.withoutUnread}
        />
      ) : null}
      {late.length > 0 ? (
        <LateLocks late={late} error={errors.lateLocks?.join(' ')} chosen={reply?.initialValue?.lateLocks} />
      ) : null}
      {changed === 0 ? <NothingNew /> : <Press number={number} />}
    </form>
  );
}

function Conflicts({ preview: { sittingId, conflicts } }: { preview: PublicationPreview }) {
  return (
    <Notice
      title={`${count(conflicts.length, 'student has', 'students have')} two readings of one size.`}
      action={
        <Link className="link" href={`/round/${sittingId}`}>
          Choose at the bench
        </Link>
      }
    >
      Nothing goes out while two readings stand against each other.
    </Notice>
  );
}

function NothingNew() {
  return (
    <p className="max-w-[48ch]">
      Nothing has changed since the last publication, so there is nothing new to tell. Change something at the
      bench or on the sitting’s list first.
    </p>
  );
}

function Press({ number }: { number: number }) {
  return (
    <div>
      <SubmitButton pendingLabel="publishing">
        {number === 1 ? 'publish' : `publish, number ${number}`}
      </SubmitButton>
      <p className="mt-3 max-w-[48ch] text-label text-ink-2">
        Students see their result, and where each point went, at once.
        {number > 1
          ? ' Theirs is marked as corrected if it differs.'
          : ' A correction later is a second publication.'}
      </p>
    </div>
  );
}
