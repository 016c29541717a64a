import type { Metadata } from 'next';
import { redirect } from 'next/navigation';
import { EntranceShell } from '@/components/shell/entrance-shell';
import { ROLE_HOME } from '@/lib/auth/roles';
import { recallSchool } from '@/lib/auth/school-cookie';
import { currentActor } from '@/lib/auth/session';
import { SignIn } from './_components/sign-in';
import { UnsentCount } from './_components/unsent-count';

export const metadata: Metadata = { title: 'Sign in' };

interface SignInPageProps {
  searchParams: Promise<{ school?: string | string[] }>;
}

export default async function SignInPage({ searchParams }: SignInPageProps) {
  const actor = await currentActor();
  if (actor) redirect(ROLE_HOME[actor.role]);
  const { school } = await searchParams;
  const known = await recallSchool();
  const code = typeof school === 'string' ? school.slice(0, 32) : null;
  return (
    <EntranceShell
      title="Sign in"
      titleBlock={[
        ...(known ? [{ label: 'school', value: known.name, wide: true }] : []),
        { label: 'unsent readings on this device', value: <UnsentCount />, wide: true },
      ]}
    >
      <SignIn who={code === null ? 'staff' : 'student'} schoolCode={code ?? known?.code ?? ''} />
    </EntranceShell>
  );
}
