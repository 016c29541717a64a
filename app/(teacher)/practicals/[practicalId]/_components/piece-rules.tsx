'use client';

import { SelectField } from '@/components/ui/select-field';
import type { RuleEffects } from '@/lib/practicals/rule-effects';
import { useEditor } from './editor-context';
import { RuleEffect } from './rule-effect';

/** How pieces are taken where a line says nothing else. */
export function PieceRules({ effects }: { effects: RuleEffects | null }) {
  const { desk } = useEditor();
  const { all } = desk.draft;
  return (
    <>
      <SelectField
        label="thickness and width"
        className="max-w-[22rem]"
        value={all.swap ? 'yes' : 'no'}
        hint="Either way round: the two readings are exchanged where that loses less."
        onChange={({ target: { value } }) =>
          desk.edit((draft) => {
            draft.all.swap = value === 'yes';
          })
        }
        options={[
          { value: 'yes', label: 'may be read either way round' },
          { value: 'no', label: 'each as it is' },
        ]}
      />
      <RuleEffect effects={effects} rule="swap" />
      <SelectField
        label="pieces of a line"
        className="max-w-[22rem]"
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
      <RuleEffect effects={effects} rule="set" />
      <p className="max-w-[52ch] text-label text-ink-2">
        One line may differ: press its number in the cut list.
      </p>
    </>
  );
}
