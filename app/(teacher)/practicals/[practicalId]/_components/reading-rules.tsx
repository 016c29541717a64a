'use client';

import type { RuleEffects } from '@/lib/practicals/rule-effects';
import { DraftField } from './draft-field';
import { RuleRow } from './rule-effect';

/** How a reading becomes a deviation: its margin, the limit past which it is another part, its rounding. */
export function ReadingRules({ effects }: { effects: RuleEffects | null }) {
  return (
    <>
      <RuleRow effects={effects} rule="margin">
        <DraftField
          path="reading.margin"
          label="reading margin"
          hint="The small free distance past every band’s edge that covers the instrument."
        />
      </RuleRow>
      <RuleRow effects={effects} rule="gross" path="reading.grossLimit">
        <DraftField
          path="reading.grossLimit"
          label="gross limit"
          optional
          hint="A size further off than this is not that part: the piece loses its worth."
        />
      </RuleRow>
      <RuleRow effects={effects} rule="readTo" path="reading.readTo">
        <DraftField
          path="reading.readTo"
          label="deviations rounded to"
          optional
          hint="To the nearest of these, a tie toward the target. Empty: scored as read."
        />
      </RuleRow>
    </>
  );
}
