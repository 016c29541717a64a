'use client';

import { LossTable } from '@/components/loss/loss-table';
import { ScoreRule } from '@/components/rule/score-rule';
import { CopyButton } from '@/components/ui/copy-button';
import { sayMoment } from '@/components/ui/days';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import type { OwnPrediction } from '@/lib/data/own/read-task';
import { explainScore } from '@/lib/practicals/explain-score';
import { type OwnRecord, predictedSheet } from '@/lib/practicals/own-record';
import type { Rubric } from '@/lib/scoring';

interface LockedSheetProps {
  lock: { receipt: string; at: string };
  record: OwnRecord;
  rubric: Rubric;
  /** What the server makes of this lock; null while it has not told. */
  prediction: OwnPrediction | null;
  sent: boolean;
  /** The results are out. */
  over: boolean;
}

/** The receipt of a lock, large enough to be read off the screen, and what the own readings would score. */
export function LockedSheet({ lock, record, rubric, prediction, sent, over }: LockedSheetProps) {
  const shown = prediction ?? {
    rubric,
    explanation: explainScore(rubric, predictedSheet(rubric, record), 0),
  };
  const { explanation } = shown;
  const unreadable = record.derived.unreadable.length;
  return (
    <div className="mt-3 grid grid-cols-[minmax(0,1fr)] gap-6">
      <section className="border-y-edge border-ink py-3">
        <Heading>Locked {sayMoment(lock.at)}</Heading>
        <div className="mt-1 flex flex-wrap items-center justify-between gap-3">
          <output
            aria-label="receipt"
            className="tnum text-[46px] leading-none font-[660] tracking-[0.02em] select-all"
          >
            {lock.receipt}
          </output>
          <CopyButton text={lock.receipt} label="copy the receipt" />
        </div>
        <p className="mt-2 max-w-[62ch] text-label text-ink-2">
          Show this when your pieces are picked up: it proves that these readings came before the bench.
          {sent
            ? ''
            : ' They are on this device and are sent as soon as there is a network; the receipt holds already.'}
        </p>
      </section>
      <section>
        <div className="flex items-end justify-between gap-4">
          <div>
            <Heading>Your predicted score</Heading>
            <p className="max-w-[40ch] text-label text-ink-2">
              {pointsAsText(explanation.kept.ofTotal)} before rounding, by your own readings
              {unreadable > 0 ? `; ${unreadable} you couldn’t read cost nothing here` : ''}.
              {over ? '' : ' The bench’s score stands beside it once the results are out.'}
              {prediction
                ? ''
                : ' This device worked it out; once your readings are sent, it is priced as your result will be.'}
            </p>
          </div>
          <p className="tnum text-score leading-none font-[680]" data-testid="predicted">
            {explanation.score === null ? '–' : pointsAsText(explanation.score)}
          </p>
        </div>
        <ScoreRule bench={null} own={explanation.kept.ofTotal} total={explanation.total} className="mt-3" />
      </section>
      <LossTable rubric={shown.rubric} explanation={explanation} heading="Where your prediction loses" />
    </div>
  );
}
