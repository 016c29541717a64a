import type { ComponentProps } from 'react';
import { type ButtonKind, type ButtonSize, buttonClass } from './button-style';

export interface ButtonProps extends ComponentProps<'button'> {
  kind?: ButtonKind;
  size?: ButtonSize;
  /** Why it cannot be pressed now. The button stays focusable and says so. */
  notYet?: string | null;
}

export function Button({ kind, size, notYet, className, children, ...props }: ButtonProps) {
  const style = buttonClass({ kind, size, notYet: Boolean(notYet), className });
  if (notYet) {
    return (
      <button {...props} type="button" aria-disabled title={notYet} onClick={undefined} className={style}>
        {children}
        <span className="sr-only">, not yet: {notYet}</span>
      </button>
    );
  }
  return (
    <button type="button" aria-pressed={kind === 'pressed' ? true : undefined} {...props} className={style}>
      {children}
    </button>
  );
}
