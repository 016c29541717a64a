'use client';

import Link from 'next/link';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { CheckboxField, ChoiceGroup, RadioField } from '@/components/ui/choice';
import { Notice } from '@/components/ui/notice';
import { pointsAsText } from '@/components/ui/points-text';
import { SubmitButton } from '@/components/ui/submit-button';
import type { PublicationPreview } from '@/lib/data/sittings/preview-publication';
import { count, spokenName } from '../../../../_components/names';
import { publishAction } from '../../../actions';

/** The teacher's word on what is still open, and the one press that tells the class. */
export function PublishForm({ preview }: { preview: PublicationPreview }) {
  const [reply, action] = useActionState(publishAction, undefined);
  const { sittingId, seen, number, changed, conflicts, unread, incomplete, late } = preview;
  const without = unread.length + incomplete.length;
  const errors = reply?.error ?? {};
  if (conflicts.length > 0) {
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
      {changed === 0 ? (
        <p className="max-w-[48ch]">
          Nothing has changed since the last publication, so there is nothing new to tell. Change something at
          the bench or on the sitting’s list first.
        </p>
      ) : (
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
      )}
    </form>
  );
}

interface LateLocksProps {
  late: PublicationPreview['late'];
  error: string | undefined;
  chosen: unknown;
}

/** Predictions locked after the bench had begun, without a receipt: neither refused nor trusted. */
function LateLocks({ late, error, chosen }: LateLocksProps) {
  return (
    <ChoiceGroup
      legend={`${count(late.length, 'prediction was', 'predictions were')} locked late`}
      error={error ?? null}
    >
      <ul className="my-2 text-label">
        {late.map((student) => (
          <li key={student.studentId}>
            {spokenName(student)}
            {student.predicted === null ? '' : ` predicted ${pointsAsText(student.predicted)}`}
            {student.bonus > 0
              ? `, worth ${pointsAsText(student.bonus)} if it counts`
              : ', worth nothing either way'}
          </li>
        ))}
      </ul>
      <p className="mb-1 max-w-[48ch] text-label text-ink-2">
        They were locked after the bench had begun on the pieces, and no receipt was taken before. You know
        whether they were made in time.
      </p>
      <RadioField name="lateLocks" value="count" defaultChecked={chosen === 'count'} label="they count" />
      <RadioField
        name="lateLocks"
        value="leave out"
        defaultChecked={chosen === 'leave out'}
        label="they earn nothing"
      />
    </ChoiceGroup>
  );
}
