import Link from 'next/link';
import type { ComponentProps } from 'react';
import { type ButtonKind, type ButtonSize, buttonClass } from './button-style';

interface LinkButtonProps extends ComponentProps<typeof Link> {
  kind?: ButtonKind;
  size?: ButtonSize;
}

/** A link that looks like a button: for going somewhere, never for changing something. */
export function LinkButton({ kind, size, className, ...props }: LinkButtonProps) {
  return <Link {...props} className={buttonClass({ kind, size, className })} />;
}
