'use client';

import { classNames } from '@/components/ui/class-names';
import { LengthText } from '@/components/ui/fraction';
import { deviationInWords, lengthInWords } from '@/components/ui/length-in-words';
import { pointsAsText } from '@/components/ui/points-text';
import type { Unit } from '@/lib/length';
import { findPiece } from '@/lib/round/pieces';
import type { RoundState, Said } from '@/lib/round/types';
import { useBench } from './bench-context';

const NOT_KEPT = 'Not kept: this tablet could not write. Look under “kept”.';

/** What the last press did, in one line, and aloud to a screen reader. */
export function SaidLine() {
  const { view } = useBench();
  const { plan } = view.state;
  const { unit } = plan.rubric;
  const said: Said | null = view.failure === null ? view.state.said : { kind: 'refused', text: NOT_KEPT };
  return (
    <>
      <p
        aria-hidden="true"
        className={classNames(
          'narrow flex min-h-7 items-end justify-end overflow-hidden text-right text-lead leading-6',
          said?.kind === 'refused' || said?.kind === 'doubt' || (said?.kind === 'zero' && said.past)
            ? 'font-[640] text-refuse'
            : 'text-ink-2',
        )}
      >
        <span>{said ? <Shown said={said} unit={unit} /> : null}</span>
      </p>
      <p role="status" className="sr-only">
        {said ? inWords(said, unit) : ''} {nextInWords(view.state)}
      </p>
    </>
  );
}

function Shown({ said, unit }: { said: Said; unit: Unit }) {
  switch (said.kind) {
    case 'read':
      return (
        <>
          {said.label}, {said.axis}: <LengthText ticks={said.deviation} unit={unit} signed />, loses{' '}
          {pointsAsText(said.lose)}
        </>
      );
    case 'doubt':
      return (
        <>
          <LengthText ticks={said.ticks} unit={unit} />: past the gross limit, press again
        </>
      );
    case 'zero':
      return (
        <>
          closed jaws show{' '}
          <LengthText ticks={said.ticks} unit={unit} signed decimals={unit === 'in' ? 3 : 2} />
          {said.past ? ': wipe the jaws and set the zero' : ', zero is good'}
        </>
      );
    default:
      return said.text;
  }
}

function inWords(said: Said, unit: Unit): string {
  switch (said.kind) {
    case 'read':
      return `${said.label}, ${said.axis}: ${deviationInWords(said.deviation, unit)}, loses ${pointsAsText(said.lose)}.`;
    case 'doubt':
      return `Not kept yet: ${lengthInWords(said.ticks, unit)} is past the gross limit. The same again keeps it.`;
    case 'zero':
      return `Closed jaws show ${deviationInWords(said.ticks, unit)}.`;
    default:
      return said.text;
  }
}

function nextInWords({ spot, plan }: RoundState): string {
  const place = spot && findPiece(plan.rubric, spot);
  if (!spot || !place) return 'Every size is read.';
  return `Next: ${place.label}, ${spot.axis}, ${lengthInWords(place.line.target[spot.axis], plan.rubric.unit)}.`;
}
