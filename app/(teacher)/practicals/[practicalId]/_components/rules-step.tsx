'use client';

import { classNames } from '@/components/ui/class-names';
import { SelectField } from '@/components/ui/select-field';
import { Heading } from '@/components/ui/titles';
import { ChecksFields } from './checks-fields';
import { DraftField } from './draft-field';
import { useEditor } from './editor-context';
import { PredictionFields } from './prediction-fields';
import { TotalFields } from './total-fields';

const GROUP = 'grid content-start gap-4';

/** What holds for the attempt as a whole: how losses become a score, and what lateness, a redo and a prediction do. */
export function RulesStep() {
  const { desk } = useEditor();
  const { draft } = desk;
  return (
    <div className="grid gap-x-12 gap-y-10 lg:grid-cols-2">
      <div className="grid content-start gap-10">
        <section aria-labelledby="total-heading" className={GROUP}>
          <Heading id="total-heading">Total</Heading>
          <TotalFields />
        </section>
        <section aria-labelledby="redo-heading" className={GROUP}>
          <Heading id="redo-heading">Redo</Heading>
          <SelectField
            label="of the first attempt and its redo counts"
            className="max-w-72"
            value={draft.redo.kind}
            onChange={({ target: { value } }) => {
              if (value === 'higher' || value === 'latest' || value === 'average') {
                desk.edit((next) => {
                  next.redo.kind = value;
                });
              }
            }}
            options={[
              { value: 'higher', label: 'the higher' },
              { value: 'latest', label: 'the last' },
              { value: 'average', label: 'the mean of all' },
            ]}
          />
          {draft.redo.kind === 'average' ? (
            <DraftField
              path="redo.roundTo"
              label="the mean is rounded to"
              kind="number"
              className="max-w-56"
            />
          ) : (
            <DraftField
              path="redo.capPercent"
              label="a redo counts up to, in percent"
              kind="number"
              className="max-w-56"
            />
          )}
        </section>
        <section aria-labelledby="late-heading" className={GROUP}>
          <Heading id="late-heading">Late</Heading>
          <p className="text-label text-ink-2">Days late are recorded. Empty: they cost nothing.</p>
          <div className="grid max-w-96 grid-cols-2 gap-4">
            <DraftField path="late.perDay" label="percent a day" kind="number" />
            <DraftField path="late.max" label="percent at most" kind="number" />
          </div>
        </section>
      </div>
      <div className="grid content-start gap-10">
        <section aria-labelledby="reading-heading" className={GROUP}>
          <Heading id="reading-heading">Reading</Heading>
          <DraftField
            path="reading.margin"
            label="reading margin"
            className="max-w-56"
            hint="The small free distance past every band’s edge that covers the instrument."
          />
          <DraftField
            path="reading.grossLimit"
            label="gross limit"
            optional
            className="max-w-56"
            hint="A size further off than this is not that part: the piece loses its worth."
          />
          <DraftField
            path="reading.readTo"
            label="deviations rounded to"
            optional
            className="max-w-56"
            hint="Empty: scored as read."
          />
        </section>
        <section aria-labelledby="prediction-heading" className={GROUP}>
          <Heading id="prediction-heading">Prediction</Heading>
          <PredictionFields />
        </section>
      </div>
      <section aria-labelledby="work-heading" className={classNames(GROUP, 'lg:col-span-2')}>
        <Heading id="work-heading">Checks of the whole work</Heading>
        <ChecksFields
          base="workChecks"
          checks={draft.workChecks}
          listIn={(next) => next.workChecks}
          emptyText="None. Add one for what is judged once for each student, such as a label."
        />
      </section>
    </div>
  );
}
