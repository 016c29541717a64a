'use client';

import { useActionState } from 'react';
import { Refusal } from '@/components/ui/refusal';
import { SubmitButton } from '@/components/ui/submit-button';
import { bringBackAction } from '../../../actions';

interface BringBackProps {
  sectionId: string;
  studentId: string;
  label: string;
}

export function BringBack({ sectionId, studentId, label }: BringBackProps) {
  const [reply, send] = useActionState(bringBackAction, undefined);
  return (
    <form action={send} className="grid gap-3">
      <input type="hidden" name="sectionId" value={sectionId} />
      <input type="hidden" name="studentId" value={studentId} />
      <div>
        <SubmitButton kind="plain">{label}</SubmitButton>
      </div>
      {reply ? <Refusal title={reply.refused} /> : null}
    </form>
  );
}
