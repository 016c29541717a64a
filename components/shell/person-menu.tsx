'use client';

import Link from 'next/link';
import type { ReactNode } from 'react';
import { Popover } from '@/components/ui/popover';
import { parseTheme } from './theme';
import { ThemeSwitch } from './theme-switch';

export interface PersonPlace {
  href: string;
  label: string;
  current?: boolean;
}

export interface ShellPerson {
  name: string;
  /** The school, or the class period for a student. */
  place?: string;
}

interface PersonMenuProps {
  person: ShellPerson;
  /** Where this person's other roles work. */
  places?: readonly PersonPlace[];
  theme: string;
  /** Sign out, lock, account: forms and links of the caller's. */
  children?: ReactNode;
}

export function PersonMenu({ person, places = [], theme, children }: PersonMenuProps) {
  const trigger = (
    <button type="button" className="inline-flex min-h-11 max-w-full items-center gap-2 text-left text-label">
      <span className="min-w-0 truncate">
        <strong>{person.name}</strong>
        {person.place ? <span className="text-ink-2 max-sm:hidden">, {person.place}</span> : null}
      </span>
      <svg
        aria-hidden="true"
        viewBox="0 0 12 8"
        className="w-3 shrink-0 fill-none stroke-current stroke-[1.75]"
      >
        <path d="M1 1.5L6 6.5L11 1.5" />
      </svg>
    </button>
  );
  return (
    <Popover trigger={trigger} label={`${person.name}, menu`} className="w-80">
      <p className="font-[660]">{person.name}</p>
      {person.place ? <p className="text-label text-ink-2">{person.place}</p> : null}
      {places.length > 1 ? (
        <nav aria-label="your roles" className="mt-3 border-t border-ink">
          {places.map((place) => (
            <Link
              key={place.href}
              href={place.href}
              aria-current={place.current ? 'true' : undefined}
              className="flex min-h-11 items-center border-b border-hair aria-[current]:font-[660]"
            >
              {place.label}
              {place.current ? <span className="ml-auto text-label text-ink-2">here</span> : null}
            </Link>
          ))}
        </nav>
      ) : null}
      <div className="mt-4">
        <p aria-hidden className="mb-1 text-label text-ink-2">
          how the sheet is lit
        </p>
        <ThemeSwitch theme={parseTheme(theme)} />
      </div>
      {children ? <div className="mt-4 flex flex-wrap gap-2 border-t border-ink pt-4">{children}</div> : null}
    </Popover>
  );
}
