import { cookies } from 'next/headers';
import Link from 'next/link';
import type { ReactNode } from 'react';
import { type NavItem, NavLinks } from '@/components/ui/nav-links';
import { Mark } from './mark';
import { PersonMenu, type PersonPlace, type ShellPerson } from './person-menu';
import { parseTheme, THEME_COOKIE } from './theme';

interface PhoneShellProps {
  home: string;
  person: ShellPerson;
  nav?: readonly NavItem[];
  places?: readonly PersonPlace[];
  menu?: ReactNode;
  children: ReactNode;
}

/** The student's screens: made for one hand, and no wider than a page on anything larger. */
export async function PhoneShell({ home, person, nav = [], places, menu, children }: PhoneShellProps) {
  const store = await cookies();
  const theme = parseTheme(store.get(THEME_COOKIE)?.value);
  return (
    <div className="mx-auto flex min-h-dvh w-full max-w-[44rem] flex-col px-4">
      <header className="flex items-end gap-3 border-b-edge border-ink pt-3 print:hidden">
        <Link href={home} aria-label="Trymark, first screen" className="-mb-px shrink-0 pl-1">
          <Mark className="h-7 w-auto" />
        </Link>
        <div className="min-w-0 flex-1 self-center">
          <PersonMenu person={person} places={places} theme={theme}>
            {menu}
          </PersonMenu>
        </div>
        {person.place ? <p className="self-center text-label text-ink-2">{person.place}</p> : null}
      </header>
      {nav.length > 0 ? <NavLinks label="main" items={nav} className="mt-1" /> : null}
      <main className="flex min-w-0 flex-1 flex-col pt-3 pb-6">{children}</main>
    </div>
  );
}
