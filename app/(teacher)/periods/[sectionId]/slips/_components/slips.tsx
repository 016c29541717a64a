'use client';

import { useEffect, useState } from 'react';
import { Button } from '@/components/ui/button';
import { Notice } from '@/components/ui/notice';
import type { PassphraseSlipsView } from '@/lib/data/account/make-passphrases';
import { saySection } from '../../../_components/words';
import { Slip } from './slip';

interface SlipsProps {
  view: PassphraseSlipsView;
  signInAt: string;
}

/** A page of slips for a mono printer: cut along the dashed lines. */
export function Slips({ view, signInAt }: SlipsProps) {
  const printed = useWarningUntilPrinted();
  const { slips, sectionName, period, schoolCode, schoolName } = view;
  const where = saySection({ name: sectionName, period });
  return (
    <>
      <div className="mb-6 grid max-w-[48rem] gap-4 print:hidden">
        <Notice title="Shown this once.">
          Print them before you leave this sheet: the words are kept nowhere. Cut along the dashed lines.
        </Notice>
        <div className="flex flex-wrap items-center gap-4">
          <Button kind={printed ? 'plain' : 'act'} onClick={() => window.print()}>
            {printed ? 'print again' : `print ${slips.length === 1 ? 'the slip' : `${slips.length} slips`}`}
          </Button>
          <p role="status">{printed ? 'Handed to the printer. Look at the paper before you leave.' : null}</p>
        </div>
      </div>
      <ul
        aria-label="slips"
        className="grid border-t border-l border-dashed border-rule sm:grid-cols-2 print:grid-cols-2 print:border-ink"
      >
        {slips.map((slip) => (
          <Slip
            key={slip.studentId}
            slip={slip}
            place={`${schoolName}, ${where}`}
            schoolCode={schoolCode}
            signInAt={signInAt}
          />
        ))}
      </ul>
    </>
  );
}

/** Leaving before anything was printed loses the words, so the browser asks first. */
function useWarningUntilPrinted(): boolean {
  const [printed, setPrinted] = useState(false);
  useEffect(() => {
    const onPrinted = () => setPrinted(true);
    window.addEventListener('afterprint', onPrinted);
    return () => window.removeEventListener('afterprint', onPrinted);
  }, []);
  useEffect(() => {
    if (printed) return;
    const ask = (event: BeforeUnloadEvent) => event.preventDefault();
    window.addEventListener('beforeunload', ask);
    return () => window.removeEventListener('beforeunload', ask);
  }, [printed]);
  return printed;
}
