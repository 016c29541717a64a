'use client';

import { useActionState } from 'react';
import type { ButtonKind, ButtonSize } from '@/components/ui/button-style';
import { SubmitButton } from '@/components/ui/submit-button';
import type { PressReply } from '../actions';

interface PressFormProps {
  action: (before: PressReply, data: FormData) => Promise<PressReply>;
  fields: Record<string, string>;
  label: string;
  /** What it does to which, for those who hear it without the row around it. */
  fullLabel?: string;
  kind?: ButtonKind;
  size?: ButtonSize;
}

/** One press that changes something; what went wrong stands below it. */
export function PressForm({
  action,
  fields,
  label,
  fullLabel,
  kind = 'plain',
  size = 'small',
}: PressFormProps) {
  const [reply, press] = useActionState(action, undefined);
  return (
    <form action={press}>
      {Object.entries(fields).map(([name, value]) => (
        <input key={name} type="hidden" name={name} value={value} />
      ))}
      <SubmitButton kind={kind} size={size} aria-label={fullLabel} className="whitespace-nowrap">
        {label}
      </SubmitButton>
      {reply ? (
        <p role="alert" className="mt-1 text-label font-[580] text-refuse">
          {reply.message}
        </p>
      ) : null}
    </form>
  );
}
