'use client';

import { Segmented } from '@/components/ui/segmented';
import { SelectField } from '@/components/ui/select-field';
import { DraftField } from './draft-field';
import { fieldId, useEditor } from './editor-context';

const ROUNDINGS = ['1', '0.5', '0.1', '0.01'];

export function TotalFields() {
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
      <div className="grid max-w-96 grid-cols-2 gap-4">
        {isStart ? <DraftField path="total.start" label="start from" kind="number" /> : null}
        <DraftField path="total.outOf" label="scaled to" kind="number" hint="Empty: as counted." />
        <SelectField
          id={fieldId('total.roundTo')}
          label="score rounded to"
          value={total.roundTo}
          error={errorsAt('total.roundTo')}
          finding={findings.find(({ path }) => path === 'total.roundTo')?.text}
          onChange={({ target: { value } }) =>
            desk.edit((draft) => {
              draft.total.roundTo = value;
            })
          }
          options={ROUNDINGS.map((value) => ({ value, label: value }))}
        />
        <DraftField
          path="total.floor"
          label="floor, in percent"
          kind="number"
          hint="No score falls below it."
        />
        <DraftField path="total.ceiling" label="bonus counts up to, in percent" kind="number" />
      </div>
      <fieldset className="grid max-w-96 gap-4">
        <legend className="sr-only">how pieces are taken, all lines</legend>
        <SelectField
          label="thickness and width"
          value={desk.draft.all.swap ? 'yes' : 'no'}
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
        <SelectField
          label="pieces of a line"
          value={desk.draft.all.set}
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
      </fieldset>
    </>
  );
}
