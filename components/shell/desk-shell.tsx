import { cookies } from 'next/headers';
import Link from 'next/link';
import type { ReactNode } from 'react';
import { type NavItem, NavLinks } from '@/components/ui/nav-links';
import { Logo } from './mark';
import { PersonMenu, type PersonPlace, type ShellPerson } from './person-menu';
import { SheetBorder } from './sheet-border';
import { parseTheme, THEME_COOKIE } from './theme';

interface DeskShellProps {
  /** Where the logo leads: the first screen of this role. */
  home: string;
  nav: readonly NavItem[];
  person: ShellPerson;
  places?: readonly PersonPlace[];
  /** What stands at the foot of the person's menu: sign out, account. */
  menu?: ReactNode;
  children: ReactNode;
}

/** Every desk screen: the drawing sheet, its header line with the links of a role, and whose desk it is. */
export async function DeskShell({ home, nav, person, places, menu, children }: DeskShellProps) {
  const store = await cookies();
  const theme = parseTheme(store.get(THEME_COOKIE)?.value);
  return (
    <SheetBorder>
      <a
        href="#content"
        className="absolute top-2 left-4 z-20 -translate-y-24 bg-act px-4 py-3 text-on-act focus:translate-y-0"
      >
        to the content
      </a>
      <header className="grid grid-cols-[auto_1fr] items-end gap-x-4 border-b-edge border-ink pt-2 lg:grid-cols-[auto_1fr_auto] lg:gap-x-12 md:pt-2 print:hidden">
        <Link
          href={home}
          aria-label="Trymark, first screen"
          className="-mb-[3px] text-[1.75rem] md:text-[2rem] lg:mb-0"
        >
          <Logo edge="narrow" />
        </Link>
        <NavLinks
          kind="header"
          label="main"
          items={nav}
          className="max-lg:order-3 max-lg:col-span-2 max-lg:mt-2"
        />
        <div className="flex min-w-0 justify-end self-center">
          <PersonMenu person={person} places={places} theme={theme}>
            {menu}
          </PersonMenu>
        </div>
      </header>
      <main id="content" tabIndex={-1} className="flex min-w-0 flex-1 flex-col pt-4 outline-none">
        {children}
      </main>
    </SheetBorder>
  );
}
