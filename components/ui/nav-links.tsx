'use client';

import Link from 'next/link';
import { usePathname } from 'next/navigation';
import type { ReactNode } from 'react';
import { classNames } from './class-names';

export interface NavItem {
  href: string;
  label: ReactNode;
  /** The step's number, for work done in order. */
  step?: number;
  /** Only this exact address is current, not those below it. */
  exact?: boolean;
}

interface NavLinksProps {
  label: string;
  items: readonly NavItem[];
  /** `header` hangs a bar from the sheet's header line; `tabs` underlines each. */
  kind?: 'header' | 'tabs';
  className?: string;
}

const HEADER = {
  list: 'gap-x-4 md:gap-x-6',
  link: 'min-h-11 px-1 border-b-[6px] border-transparent hover:border-hair',
  current: 'border-act font-[660] hover:border-act',
};
const TABS = {
  list: 'gap-x-4 gap-y-1',
  link: 'min-h-11 px-1 border-b border-rule hover:border-ink',
  current: 'border-b-[4px] border-act font-[660] hover:border-act',
};

export function NavLinks({ label, items, kind = 'tabs', className }: NavLinksProps) {
  const path = usePathname();
  const style = kind === 'header' ? HEADER : TABS;
  const current = items
    .filter((item) => path === item.href || (!item.exact && path.startsWith(`${item.href}/`)))
    .sort((a, b) => b.href.length - a.href.length)[0];
  return (
    <nav aria-label={label} className={className}>
      <ul className={classNames('flex flex-wrap', style.list)}>
        {items.map((item) => (
          <li key={item.href}>
            <Link
              href={item.href}
              aria-current={item === current ? 'page' : undefined}
              className={classNames(
                'inline-flex items-center gap-2 pt-1',
                style.link,
                item === current && style.current,
              )}
            >
              {item.step ? <span className="tnum text-ink-2">{item.step}</span> : null}
              {item.label}
            </Link>
          </li>
        ))}
      </ul>
    </nav>
  );
}
