'use client';

import { Segmented } from '@/components/ui/segmented';
import { SelectField } from '@/components/ui/select-field';
import type { RuleEffects } from '@/lib/practicals/rule-effects';
import { DraftField } from './draft-field';
import { fieldId, useEditor } from './editor-context';
import { FindingText } from './finding-text';
import { RuleRow } from './rule-effect';

const ROUNDINGS = ['1', '0.5', '0.1', '0.01'];

/** How losses become a score. */
export function TotalFields({ effects }: { effects: RuleEffects | null }) {
  const { desk, errorsAt, findings } = useEditor();
  const { total } = desk.draft;
  const isStart = total.basis === 'start';
  return (
    <>
      <Segmented
        label="points are counted"
        showLabel
        options={[
          { value: 'worth', label: 'from the pieces’ worth' },
          { value: 'start', label: 'start from 100, take off' },
        ]}
        value={total.basis}
        onChange={(value) =>
          desk.edit(({ total: next, presets }) => {
            next.basis = value === 'start' ? 'start' : 'worth';
            if (value === 'start') {
              next.start ||= '100';
              next.outOf = '';
              if (!presets.includes('start-from-100')) presets.push('start-from-100');
            } else {
              next.outOf ||= '100';
            }
          })
        }
      />
      <p className="max-w-[52ch] text-label text-ink-2">
        {isStart
          ? 'Losses come off one starting score, whatever the pieces are worth.'
          : 'Each piece is worth so many points; what is not lost of them is kept.'}
      </p>
      <RuleRow effects={effects} rule="scale" path="total.start">
        <div className="grid gap-4">
          {isStart ? <DraftField path="total.start" label="start from" kind="number" /> : null}
          <DraftField path="total.outOf" label="scaled to" kind="number" hint="Empty: as counted." />
        </div>
      </RuleRow>
      <RuleRow effects={effects} rule="rounding" path="total.roundTo">
        <SelectField
          id={fieldId('total.roundTo')}
          label="score rounded to"
          value={total.roundTo}
          error={errorsAt('total.roundTo')}
          finding={findings
            .filter(({ path }) => path === 'total.roundTo')
            .map((finding) => <FindingText key={finding.code} {...finding} />)
            .at(0)}
          hint="Once, at the very end, half up."
          onChange={({ target: { value } }) =>
            desk.edit((draft) => {
              draft.total.roundTo = value;
            })
          }
          options={ROUNDINGS.map((value) => ({ value, label: value }))}
        />
      </RuleRow>
      <RuleRow effects={effects} rule="floor">
        <DraftField
          path="total.floor"
          label="floor, in percent"
          kind="number"
          hint="What is kept never falls below so much of the total; days late still take from it."
        />
      </RuleRow>
      <RuleRow effects={effects} rule="ceiling">
        <DraftField
          path="total.ceiling"
          label="bonus counts up to, in percent"
          kind="number"
          hint="100: a bonus never lifts a score above the total."
        />
      </RuleRow>
    </>
  );
}
