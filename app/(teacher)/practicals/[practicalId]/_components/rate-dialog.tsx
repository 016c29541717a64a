'use client';

import { useState } from 'react';
import { FittedRuleFace } from '@/components/rule/fitted-rule-face';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { LengthText } from '@/components/ui/fraction';
import { NumberField } from '@/components/ui/number-field';
import { Refusal } from '@/components/ui/refusal';
import { TextField } from '@/components/ui/text-field';
import type { Length, Unit } from '@/lib/length';
import { sizeRuleOf } from '@/lib/practicals/draft-of';
import { FieldReader } from '@/lib/practicals/field-reader';
import { ruleScaleOf } from '@/lib/practicals/rule-scale-of';
import { bandsFromRate, type SizeRule } from '@/lib/scoring';
import { useEditor } from './editor-context';
import { marginOf } from './read-draft';
import type { SizeRuleDesk } from './use-size-rule';

const FIRST = {
  in: { free: '1/32', step: '1/32', lose: '1', cap: '3' },
  mm: { free: '0.5', step: '0.5', lose: '1', cap: '3' },
};

type Typed = (typeof FIRST)['in'];
type RateErrors = Partial<Record<keyof Typed | '', string[]>>;

function readRate(typed: Typed, unit: Unit): { rule: SizeRule } | { errors: RateErrors } {
  const reader = new FieldReader(unit);
  const rate = {
    free: reader.distance('free', typed.free),
    step: reader.size('step', typed.step),
    lose: reader.points('lose', typed.lose),
    cap: reader.points('cap', typed.cap),
  };
  if (rate.lose === 0 && !reader.errors.lose) reader.refuse('lose', 'A step costs more than 0.');
  if (Object.keys(reader.errors).length > 0) return { errors: reader.errors };
  try {
    return { rule: bandsFromRate(rate) };
  } catch (error) {
    if (!(error instanceof RangeError)) throw error;
    return {
      errors: { '': ['This makes more than 20 bands a side. Make the step wider, or let a size lose less.'] },
    };
  }
}

/** So many points for every step begun past the free distance, written out as bands. */
export function RateDialog({ size, target }: { size: SizeRuleDesk; target: Length }) {
  const { desk, unit } = useEditor();
  const [open, setOpen] = useState(false);
  const [typed, setTyped] = useState<Typed>(FIRST[unit]);
  const [errors, setErrors] = useState<RateErrors>({});
  const field = (key: keyof Typed, label: string) => ({
    label,
    value: typed[key],
    error: errors[key],
    onChange: (event: React.ChangeEvent<HTMLInputElement>) =>
      setTyped({ ...typed, [key]: event.target.value }),
  });

  function apply() {
    const read = readRate(typed, unit);
    if ('errors' in read) {
      setErrors(read.errors);
      return;
    }
    const rule = sizeRuleOf(read.rule, unit);
    size.change((each) => Object.assign(each, structuredClone(rule)));
    desk.edit(({ presets }) => void (presets.includes('rate-per-step') || presets.push('rate-per-step')));
    setErrors({});
    setOpen(false);
  }

  return (
    <>
      <Button size="small" className="min-h-9" onClick={() => setOpen(true)}>
        rate per step
      </Button>
      <Dialog
        open={open}
        onOpenChange={setOpen}
        title="Rate per step"
        description="Every step begun past the free distance costs the same, up to the most that a size loses."
      >
        <form
          onSubmit={(event) => {
            event.preventDefault();
            event.stopPropagation();
            apply();
          }}
        >
          <div className="grid gap-4 sm:grid-cols-2">
            <TextField {...field('free', 'free distance')} />
            <TextField {...field('step', 'step')} />
            <NumberField {...field('lose', 'points a step')} />
            <NumberField {...field('cap', 'most that a size loses')} />
          </div>
          <RatePreview {...{ typed, unit, target }} margin={marginOf(desk.draft)} />
          {errors[''] ? <Refusal title={errors['']} className="mt-4" /> : null}
          <div className="mt-6 flex justify-end gap-2">
            <Button onClick={() => setOpen(false)}>leave it</Button>
            <Button type="submit" kind="act">
              write the bands
            </Button>
          </div>
        </form>
      </Dialog>
    </>
  );
}

interface RatePreviewProps {
  typed: Typed;
  unit: Unit;
  target: Length;
  margin: Length;
}

/** The bands that the rate would write, on their rule; nothing while it cannot be read. */
function RatePreview({ typed, unit, target, margin }: RatePreviewProps) {
  const read = readRate(typed, unit);
  if ('errors' in read) return null;
  const { rule } = read;
  return (
    <div className="mt-4">
      <FittedRuleFace
        {...{ unit, target, rule, margin }}
        {...ruleScaleOf([rule], unit, 2)}
        label="as written"
      />
      <p className="mt-1 text-label text-ink-2">
        {rule.over.length} {rule.over.length === 1 ? 'band' : 'bands'} a side, the last to{' '}
        <LengthText ticks={rule.over.at(-1)?.within ?? 0} unit={unit} />.
      </p>
    </div>
  );
}
