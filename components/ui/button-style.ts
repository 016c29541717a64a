import { classNames } from './class-names';

export type ButtonKind = 'plain' | 'act' | 'pressed' | 'refuse' | 'quiet';
export type ButtonSize = 'small' | 'desk' | 'bench';

const KINDS: Record<ButtonKind, string> = {
  plain: 'border-ink bg-plate text-ink active:bg-ink active:text-sheet',
  act: 'border-act bg-act text-on-act active:border-ink active:bg-ink active:text-sheet',
  pressed: 'border-ink bg-ink text-sheet',
  refuse: 'border-refuse bg-plate text-refuse active:bg-refuse active:text-sheet',
  quiet:
    'border-transparent bg-transparent text-act underline underline-offset-4 decoration-[1.5px] active:text-ink',
};

const SIZES: Record<ButtonSize, string> = {
  small: 'min-h-8 px-3 py-1 text-label',
  desk: 'min-h-11 px-4 py-2 text-text md:min-h-10',
  bench: 'min-h-touch min-w-touch px-3 text-key',
};

const NOT_YET = 'border-dashed border-rule bg-transparent text-ink-2 active:bg-transparent active:text-ink-2';

/** The look of everything that is pressed: buttons, submit buttons and links that act as one. */
export function buttonClass(style: {
  kind?: ButtonKind;
  size?: ButtonSize;
  notYet?: boolean;
  className?: string;
}): string {
  const { kind = 'plain', size = 'desk', notYet = false, className } = style;
  return classNames(
    'inline-flex items-center justify-center gap-2 border text-center font-[620] select-none',
    KINDS[kind],
    SIZES[size],
    notYet && NOT_YET,
    className,
  );
}
