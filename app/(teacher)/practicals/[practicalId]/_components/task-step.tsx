'use client';

import { Heading } from '@/components/ui/titles';
import { CopyThis } from './copy-this';
import { DraftField } from './draft-field';
import { useEditor } from './editor-context';

/** What students are given: the title, the wood, and what to do with it. */
export function TaskStep() {
  const { unit, desk, practicalId } = useEditor();
  const inWords = unit === 'in' ? 'inches' : 'millimetres';
  return (
    <div className="grid gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,5fr)_minmax(0,4fr)]">
      <section aria-labelledby="task-heading" className="grid content-start gap-4">
        <Heading id="task-heading">Task</Heading>
        <DraftField path="title" label="title" />
        <DraftField
          path="instructions"
          label="instructions"
          kind="area"
          rows={12}
          optional
          hint="Students read this before they cut. The usual cautions stand beside it by themselves."
        />
      </section>
      <section aria-labelledby="blank-heading" className="grid content-start gap-4">
        <Heading id="blank-heading">Blank</Heading>
        <p className="text-label text-ink-2">
          Sizes in {inWords}, typed as you write them:{' '}
          {unit === 'in' ? '1 3/8, 1-3/8 or 1.375' : '35 or 35,5'}. This practical was made in {inWords} and
          stays so.
        </p>
        <DraftField path="material" label="wood" optional hint="Such as poplar, or maple." />
        <div className="grid grid-cols-3 gap-3">
          <DraftField path="blank.thickness" label="thickness" />
          <DraftField path="blank.width" label="width" />
          <DraftField path="blank.length" label="length" />
        </div>
        <DraftField path="kerf" label="kerf" optional className="max-w-40" hint="How wide the saw cuts." />
        <Heading className="mt-4">Another one like it</Heading>
        <CopyThis {...{ practicalId, desk }} />
      </section>
    </div>
  );
}
