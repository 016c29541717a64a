'use client';

import type { RuleEffects } from '@/lib/practicals/rule-effects';
import { DraftField } from './draft-field';
import { RuleEffect } from './rule-effect';

/** How a reading becomes a deviation: its margin, the limit past which it is another part, its rounding. */
export function ReadingRules({ effects }: { effects: RuleEffects | null }) {
  return (
    <>
      <DraftField
        path="reading.margin"
        label="reading margin"
        className="max-w-[22rem]"
        hint="The small free distance past every band’s edge that covers the instrument."
      />
      <RuleEffect effects={effects} rule="margin" />
      <DraftField
        path="reading.grossLimit"
        label="gross limit"
        optional
        className="max-w-[22rem]"
        hint="A size further off than this is not that part: the piece loses its worth."
      />
      <RuleEffect effects={effects} rule="gross" />
      <DraftField
        path="reading.readTo"
        label="deviations rounded to"
        optional
        className="max-w-[22rem]"
        hint="To the nearest of these before it is priced, a tie toward the target. Empty: scored as read."
      />
      <RuleEffect effects={effects} rule="readTo" />
    </>
  );
}
