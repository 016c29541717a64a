'use client';

import { useActionState, useState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { Button } from '@/components/ui/button';
import { sayDay } from '@/components/ui/days';
import { Dialog } from '@/components/ui/dialog';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import type { FormReply } from '@/lib/transport/form';
import { changeDueAction } from '../../actions';

interface ChangeDueProps {
  sittingId: string;
  dueOn: string | null;
  today: string;
}

/** The day the pieces are due, and the way to change it. */
export function ChangeDue({ sittingId, dueOn, today }: ChangeDueProps) {
  const [open, setOpen] = useState(false);
  const [reply, action] = useActionState(async (before: FormReply, data: FormData) => {
    const answer = await changeDueAction(before, data);
    if (answer?.status === 'success') setOpen(false);
    return answer;
  }, undefined);
  return (
    <p className="flex items-baseline gap-2 text-label">
      {dueOn ? `due ${sayDay(dueOn, today)}` : 'due on no day'}
      <Button kind="quiet" size="small" className="px-0" onClick={() => setOpen(true)}>
        {dueOn ? 'change the day' : 'set the day'}
      </Button>
      <Dialog open={open} onOpenChange={setOpen} title="When is it due?">
        <form action={action} className="grid gap-4">
          <input type="hidden" name="sittingId" value={sittingId} />
          <FormRefusal errors={reply?.error?.[''] ?? undefined} />
          <TextField
            label="due"
            optional
            type="date"
            name="dueOn"
            defaultValue={dueOn ?? ''}
            error={reply?.error?.dueOn}
            className="max-w-60"
          />
          <div>
            <SubmitButton pendingLabel="keeping it">keep</SubmitButton>
          </div>
        </form>
      </Dialog>
    </p>
  );
}
