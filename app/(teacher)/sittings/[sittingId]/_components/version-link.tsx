import Link from 'next/link';
import type { MoveChoices } from '@/lib/contracts/moves';

/** The version that prices this sitting, and the way to another. */
export function VersionLink({ choices }: { choices: MoveChoices }) {
  return (
    <p className="flex flex-wrap items-baseline gap-x-2 text-label">
      version {choices.version.number}
      <Link href={`/sittings/${choices.sittingId}/move`} className="link inline-block py-1 font-[620]">
        another version
      </Link>
    </p>
  );
}
