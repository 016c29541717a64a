import type { PassphraseSlip } from '@/lib/data/account/reset-passphrase';

interface SlipProps {
  slip: PassphraseSlip;
  place: string;
  schoolCode: string;
  signInAt: string;
}

/** One slip, as high as five to a sheet of either paper size. */
export function Slip({ slip, place, schoolCode, signInAt }: SlipProps) {
  const { givenName, familyName, localId, words } = slip;
  return (
    <li className="flex min-h-[46mm] break-inside-avoid flex-col border-r border-b border-dashed border-rule p-4 print:border-ink print:py-2">
      <p className="text-lead font-[660]">{[givenName, familyName].filter(Boolean).join(' ')}</p>
      <p className="text-small text-ink-2">{place}</p>
      <p
        data-testid="words"
        className="my-2 border-y border-ink py-1.5 font-title text-[1.375rem] leading-7 font-[580] print:text-[1.1875rem]"
      >
        {words}
      </p>
      <dl className="tnum mt-auto grid grid-cols-[auto_minmax(0,1fr)] gap-x-3 text-label">
        <dt className="text-ink-2">sign in at</dt>
        <dd className="font-[620] break-words">{signInAt}</dd>
        <dt className="text-ink-2">school code</dt>
        <dd className="font-[620]">{schoolCode}</dd>
        <dt className="text-ink-2">ID</dt>
        <dd className="font-[620]">{localId}</dd>
      </dl>
    </li>
  );
}
