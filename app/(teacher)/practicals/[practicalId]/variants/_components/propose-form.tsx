import { LengthText } from '@/components/ui/fraction';
import { Segmented } from '@/components/ui/segmented';
import { SubmitButton } from '@/components/ui/submit-button';
import type { Unit } from '@/lib/length';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import {
  FIRST_GRADUATION,
  GRADUATION_TICKS,
  VARIANT_GRADUATIONS,
  type VariantGraduation,
} from '@/lib/practicals/propose-variants-graduation';

interface ProposeFormProps {
  practicalId: string;
  unit: Unit;
  count?: number;
  graduation?: VariantGraduation;
  /** How far a size has to move, when it is known. */
  step?: number;
}

/** How many variants, and on which graduation; the proposals have an address of their own. */
export function ProposeForm({ practicalId, unit, count = 2, graduation, step }: ProposeFormProps) {
  return (
    <form
      action={`/practicals/${practicalId}/variants/propose`}
      className="mt-3 flex flex-wrap items-end gap-x-6 gap-y-3"
    >
      <Segmented
        name="count"
        label="how many"
        showLabel
        defaultValue={String(count)}
        options={[1, 2, 3, 4, 5, 6].map((each) => ({ value: String(each), label: String(each) }))}
      />
      <Segmented
        name="graduation"
        label="sizes move by whole"
        showLabel
        defaultValue={graduation ?? FIRST_GRADUATION[unit]}
        options={VARIANT_GRADUATIONS.map((value) => ({
          value,
          label: `${lengthAsTyped(GRADUATION_TICKS[unit][value], unit)} ${unit}`,
        }))}
      />
      <SubmitButton pendingLabel="looking …">propose sizes</SubmitButton>
      {step === undefined ? null : (
        <p className="pb-2.5 text-label text-ink-2">
          To be told apart, a size has to move by <LengthText ticks={step} unit={unit} withUnit /> at least.
        </p>
      )}
    </form>
  );
}
