'use client';

import { useFormStatus } from 'react-dom';
import { Button, type ButtonProps } from './button';

interface SubmitButtonProps extends ButtonProps {
  /** What it says while the form is on its way. */
  pendingLabel?: string;
}

export function SubmitButton({
  pendingLabel,
  kind = 'act',
  children,
  disabled,
  ...props
}: SubmitButtonProps) {
  const { pending } = useFormStatus();
  return (
    <Button type="submit" kind={kind} disabled={disabled || pending} aria-busy={pending} {...props}>
      {pending && pendingLabel ? pendingLabel : children}
    </Button>
  );
}
