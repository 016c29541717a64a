'use client';

import { useActionState, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { NumberField } from '@/components/ui/number-field';
import { Refusal } from '@/components/ui/refusal';
import { Segmented } from '@/components/ui/segmented';
import { SubmitButton } from '@/components/ui/submit-button';
import type { SittingStudentView } from '@/lib/data/sittings/read-sitting';
import type { FormReply } from '@/lib/transport/form';
import { spokenName } from '../../../_components/names';
import { changeAttemptAction, startRedoAction } from '../../actions';

const STANDINGS = [
  { value: 'expected', label: 'expected' },
  { value: 'absent', label: 'absent' },
  { value: 'excused', label: 'excused' },
  { value: 'zero', label: 'zero' },
];

interface ChangeAttemptProps {
  sittingId: string;
  student: SittingStudentView;
}

/** What the desk decides about one student: standing, days late, a second attempt. */
export function ChangeAttempt({ sittingId, student }: ChangeAttemptProps) {
  const [open, setOpen] = useState(false);
  const name = spokenName(student);
  const close = () => setOpen(false);
  const mayRedo =
    student.standing === 'zero' || (student.standing === 'expected' && student.progress === 'read');
  return (
    <>
      <Button
        kind="quiet"
        size="small"
        className="px-0"
        onClick={() => setOpen(true)}
        aria-label={`change ${name}`}
      >
        change
      </Button>
      <Dialog open={open} onOpenChange={setOpen} title={name}>
        <StandingForm sittingId={sittingId} student={student} onDone={close} />
        {mayRedo ? <RedoForm sittingId={sittingId} student={student} onDone={close} /> : null}
      </Dialog>
    </>
  );
}

interface FormProps extends ChangeAttemptProps {
  onDone: () => void;
}

function StandingForm({ sittingId, student, onDone }: FormProps) {
  const [reply, action] = useReply(changeAttemptAction, onDone);
  return (
    <form action={action} className="grid gap-4">
      <input type="hidden" name="sittingId" value={sittingId} />
      <input type="hidden" name="attemptId" value={student.attemptId} />
      <FirstError reply={reply} />
      <Segmented
        label="this student is"
        showLabel
        name="standing"
        options={STANDINGS}
        defaultValue={student.standing}
      />
      <p className="max-w-[52ch] text-label text-ink-2">
        Absent and excused go out as words, without a number. A zero is a number and counts in the mean.
      </p>
      <NumberField
        label="days late"
        name="days"
        inputMode="numeric"
        defaultValue={String(student.daysLate)}
        error={reply?.error?.days ?? undefined}
        className="max-w-32"
      />
      <div>
        <SubmitButton pendingLabel="keeping it">keep</SubmitButton>
      </div>
    </form>
  );
}

function RedoForm({ sittingId, student, onDone }: FormProps) {
  const [reply, action] = useReply(startRedoAction, onDone);
  return (
    <form action={action} className="mt-6 grid gap-3 border-t border-ink pt-4">
      <input type="hidden" name="sittingId" value={sittingId} />
      <input type="hidden" name="studentId" value={student.studentId} />
      <FirstError reply={reply} />
      <p className="max-w-[52ch]">
        A redo is attempt {student.attemptNumber + 1}: new pieces, read from the start. What was read so far
        stays.
      </p>
      <div>
        <SubmitButton kind="plain" pendingLabel="opening it">
          give attempt {student.attemptNumber + 1}
        </SubmitButton>
      </div>
    </form>
  );
}

function FirstError({ reply }: { reply: FormReply }) {
  const [message] = reply?.error?.[''] ?? [];
  return message ? <Refusal title={message} /> : null;
}

/** Runs the action and closes its dialog once it has succeeded. */
function useReply(
  action: (before: FormReply, data: FormData) => Promise<FormReply>,
  onDone: () => void,
): [FormReply, (data: FormData) => void] {
  const [reply, run] = useActionState(async (before: FormReply, data: FormData) => {
    const answer = await action(before, data);
    if (answer?.status === 'success') onDone();
    return answer;
  }, undefined);
  return [reply, run];
}
