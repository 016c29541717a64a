import type { Metadata } from 'next';
import { EntranceShell } from '@/components/shell/entrance-shell';
import { Logo } from '@/components/shell/mark';
import { SheetBorder } from '@/components/shell/sheet-border';
import { PageTitle } from '@/components/ui/titles';
import { clientAddress } from '@/lib/auth/client-address';
import { proposeTerm } from '@/lib/contracts/school';
import { readSetupLink } from '@/lib/data/account/read-link';
import { LinkEnded } from '../../_components/link-ended';
import { SetUpForm } from './_components/set-up-form';

export const metadata: Metadata = { title: 'Set up your school', referrer: 'no-referrer' };

const zones = ['UTC', ...Intl.supportedValuesOf('timeZone').filter((zone) => zone !== 'UTC')];

export default async function SetUpPage({ params }: { params: Promise<{ secret: string }> }) {
  const { secret } = await params;
  const link = await readSetupLink({ secret }, await clientAddress());
  if (!link.ok) {
    return (
      <EntranceShell title="Set up your school">
        <LinkEnded message={link.problem.message} />
      </EntranceShell>
    );
  }
  const term = proposeTerm(new Date().toISOString().slice(0, 10));
  return (
    <SheetBorder>
      <header className="border-b-edge border-ink pt-2 text-[1.75rem] md:text-[2rem]">
        <span className="-mb-[3px] inline-block">
          <Logo />
        </span>
      </header>
      <main className="flex flex-1 flex-col pt-4">
        <PageTitle>Set up your school</PageTitle>
        <p className="mt-2 mb-6 max-w-[62ch]">
          This makes the school and its first admin: you. All of it can be changed later but the code, which
          your students type to sign in. The link that brought you here works once.
        </p>
        <SetUpForm secret={secret} term={term} zones={zones} />
      </main>
    </SheetBorder>
  );
}
