'use client';

import type { RuleEffects } from '@/lib/practicals/rule-effects';
import { DraftField } from './draft-field';
import { RuleEffect } from './rule-effect';

/** What a student’s own readings must reach to earn the bonus. */
export function PredictionFields({ effects }: { effects: RuleEffects | null }) {
  return (
    <>
      <p className="max-w-[52ch] text-label text-ink-2">
        Students lock a score of their own before you measure. How well they measured earns a bonus; how well
        they cut does not count in it.
      </p>
      <div className="grid max-w-[30rem] grid-cols-2 items-end gap-4">
        <DraftField path="prediction.full" label="bonus for measuring well" kind="number" />
        <DraftField path="prediction.agreeWithin" label="a size agrees within" />
        <DraftField path="prediction.agreeShare" label="sizes that must agree" />
        <DraftField path="prediction.caughtShare" label="off-band sizes caught" />
        <DraftField path="prediction.valueShare" label="sizes read by number" />
      </div>
      <RuleEffect effects={effects} rule="prediction" />
      <div className="grid max-w-[30rem] grid-cols-2 items-end gap-4">
        <DraftField path="prediction.close" label="or bonus for close totals" kind="number" />
        <DraftField path="prediction.closeWithin" label="totals are close within" kind="number" />
      </div>
      <RuleEffect effects={effects} rule="close" />
    </>
  );
}
