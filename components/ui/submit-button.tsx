'use client';

import { useFormStatus } from 'react-dom';
import { Button, type ButtonProps } from './button';

interface SubmitButtonProps extends ButtonProps {
  /** What it says while the form is on its way. */
  pendingLabel?: string;
}

/** While the form is on its way it cannot be pressed again, and keeps the focus. */
export function SubmitButton({ pendingLabel, kind = 'act', children, onClick, ...props }: SubmitButtonProps) {
  const { pending } = useFormStatus();
  return (
    <Button
      type="submit"
      kind={kind}
      aria-disabled={pending || undefined}
      aria-busy={pending}
      {...props}
      onClick={pending ? (event) => event.preventDefault() : onClick}
    >
      {pending && pendingLabel ? pendingLabel : children}
    </Button>
  );
}
