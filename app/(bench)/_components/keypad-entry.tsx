'use client';

import { Fraction, LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import { parseLength } from '@/lib/length';
import { findPiece } from '@/lib/round/pieces';
import { priceSize } from '@/lib/round/price-size';
import { useBench } from './bench-context';
import { Keys } from './keypad-keys';
import { Neighbours } from './keypad-neighbours';

/** Neighbours of the target first, one tap each; then the keys. What is typed is what is kept. */
export function KeypadEntry({ why }: { why?: string }) {
  return (
    <section aria-label="keypad" className="border-outline border-t-edge border-ink">
      <div className="grid grid-cols-5 lg:grid-cols-13">
        <Neighbours />
        <Display why={why} />
        <Keys />
      </div>
    </section>
  );
}

/** What has been typed, and what it would lose. */
function Display({ why }: { why: string | undefined }) {
  const { view, typing } = useBench();
  const { spot, plan, keypad } = view.state;
  const { rubric } = plan;
  const place = spot && findPiece(rubric, spot);
  const text = typing || keypad.text;
  const parsed = parseLength(text, keypad.unit);
  const price =
    parsed.ok && parsed.ticks > 0 && place && spot
      ? priceSize(rubric, place.line, spot.axis, parsed.ticks)
      : null;
  return (
    <div className="col-span-5 flex min-h-touch items-center justify-between gap-3 border-b-edge border-act bg-sheet px-4 lg:col-span-4">
      <div className="narrow text-lead leading-6">
        {price && parsed.ok && place && spot ? (
          <>
            <span className="block font-[600]">
              <LengthText ticks={parsed.ticks - place.line.target[spot.axis]} unit={rubric.unit} signed />
            </span>
            <span className={price.gross ? 'font-[640] text-refuse' : 'text-ink-2'}>
              {price.gross ? 'past the gross limit' : `loses ${pointsAsText(price.lose)}`}
            </span>
          </>
        ) : (
          <span className="text-ink-2">{why ?? ''}</span>
        )}
      </div>
      <output
        aria-label="typed"
        className="narrow border-r-edge border-act pr-2 text-[42px] leading-none font-[620] whitespace-nowrap"
      >
        {parsed.ok && !/[ /]$/.test(text) ? <Fraction parts={typedParts(text)} /> : text}
        <span className="text-lead font-[440] text-ink-2"> {keypad.unit}</span>
      </output>
    </div>
  );
}

/** The typed text set as a fraction, without reducing it: 4/8 stays 4/8. */
function typedParts(text: string) {
  const match = /^(?:(\d+) )?(\d+)\/(\d+)$/.exec(text);
  return {
    sign: '' as const,
    whole: match ? (match[1] ?? '') : text,
    num: match ? Number(match[2]) : null,
    den: match ? Number(match[3]) : null,
  };
}
