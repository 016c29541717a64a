import type { Metadata } from 'next';
import Link from 'next/link';
import { EntranceShell } from '@/components/shell/entrance-shell';
import { LinkButton } from '@/components/ui/link-button';
import { AskReset } from './_components/ask-reset';

export const metadata: Metadata = { title: 'Forgotten password' };

export default async function ResetPage({ searchParams }: { searchParams: Promise<{ sent?: string }> }) {
  const { sent } = await searchParams;
  if (sent) {
    return (
      <EntranceShell title="Check your mail">
        <p className="mb-4">
          If there is an account with that email, a link is on its way to it. It works once, for one hour.
        </p>
        <p className="mb-6 text-ink-2">
          Nothing there after a few minutes? Look among the unwanted mail, and check the address with your
          school’s admin.
        </p>
        <span className="flex flex-wrap gap-2">
          <LinkButton href="/sign-in">to sign-in</LinkButton>
          <LinkButton kind="quiet" href="/reset">
            try another address
          </LinkButton>
        </span>
      </EntranceShell>
    );
  }
  return (
    <EntranceShell title="Forgotten password">
      <p className="mb-4">Type the email you sign in with. A link to choose a new password comes by mail.</p>
      <AskReset />
      <p className="mt-6 text-label text-ink-2">
        A student? Ask your teacher: new words are made at the bench.{' '}
        <Link className="link" href="/sign-in">
          back to sign-in
        </Link>
      </p>
    </EntranceShell>
  );
}
