'use client';

import { SelectField } from '@/components/ui/select-field';
import type { RuleEffects } from '@/lib/practicals/rule-effects';
import { useEditor } from './editor-context';
import { RuleRow } from './rule-effect';

/** How pieces are taken where a line says nothing else. */
export function PieceRules({ effects }: { effects: RuleEffects | null }) {
  const { desk } = useEditor();
  const { all } = desk.draft;
  return (
    <>
      <RuleRow effects={effects} rule="swap">
        <SelectField
          label="thickness and width"
          value={all.swap ? 'yes' : 'no'}
          hint="Either way round: the two readings are exchanged where that loses less."
          onChange={({ target: { value } }) =>
            desk.edit((draft) => {
              draft.all.swap = value === 'yes';
            })
          }
          options={[
            { value: 'yes', label: 'either way round' },
            { value: 'no', label: 'each as it is' },
          ]}
        />
      </RuleRow>
      <RuleRow effects={effects} rule="set">
        <SelectField
          label="pieces of a line"
          value={all.set}
          hint="As the worst of them: for parts that are of use only as a matching set."
          onChange={({ target: { value } }) =>
            desk.edit((draft) => {
              draft.all.set = value === 'worst' ? 'worst' : 'each';
            })
          }
          options={[
            { value: 'each', label: 'each by itself' },
            { value: 'worst', label: 'all as the worst of them' },
          ]}
        />
      </RuleRow>
      <p className="max-w-[52ch] text-label text-ink-2">
        One line may differ: press its number in the cut list.
      </p>
    </>
  );
}
