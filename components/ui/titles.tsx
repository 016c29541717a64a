import type { ComponentProps } from 'react';
import { classNames } from './class-names';

/** The one title of a page. */
export function PageTitle({ className, ...props }: ComponentProps<'h1'>) {
  return <h1 {...props} className={classNames('font-title text-title text-balance', className)} />;
}

export function Heading({ className, ...props }: ComponentProps<'h2'>) {
  return <h2 {...props} className={classNames('text-heading', className)} />;
}

/** A sentence of judgement, set in the title face. */
export function Verdict({ className, ...props }: ComponentProps<'p'>) {
  return <p {...props} className={classNames('max-w-[60ch] font-title text-verdict', className)} />;
}
