'use client';

import type { ReactNode } from 'react';
import { SelectField } from '@/components/ui/select-field';
import { Heading } from '@/components/ui/titles';
import { ruleEffects } from '@/lib/practicals/rule-effects';
import { ChecksFields } from './checks-fields';
import { DraftField } from './draft-field';
import { useEditor } from './editor-context';
import { PieceRules } from './piece-rules';
import { PredictionFields } from './prediction-fields';
import { ReadingRules } from './reading-rules';
import { RuleEffect, RuleRow } from './rule-effect';
import { TotalFields } from './total-fields';

/** What holds for the attempt as a whole: how losses become a score, and what lateness, a redo and a prediction do. */
export function RulesStep() {
  const { desk, parsed } = useEditor();
  const { draft } = desk;
  const effects =
    parsed.ok && parsed.rubric.lines.length > 0 ? ruleEffects(parsed.rubric, parsed.form) : null;
  return (
    <div className="grid gap-x-12 gap-y-10 lg:grid-cols-[repeat(2,minmax(0,1fr))]">
      <div className="grid content-start gap-10">
        <Group id="total" title="Total">
          <TotalFields effects={effects} />
        </Group>
        <Group id="redo" title="Redo">
          <RuleRow effects={effects} rule="redo">
            <div className="grid gap-4">
              <SelectField
                label="of first attempt and redo counts"
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
                <DraftField path="redo.roundTo" label="the mean is rounded to" kind="number" />
              ) : (
                <DraftField
                  path="redo.capPercent"
                  label="up to, in percent"
                  kind="number"
                  hint="A first attempt above it keeps its score."
                />
              )}
            </div>
          </RuleRow>
        </Group>
        <Group id="late" title="Late">
          <p className="max-w-[52ch] text-label text-ink-2">
            Days late are recorded either way. Leave both empty and they cost nothing.
          </p>
          <RuleRow effects={effects} rule="late">
            <div className="grid grid-cols-2 items-end gap-4">
              <DraftField path="late.perDay" label="percent a day" kind="number" />
              <DraftField path="late.max" label="percent at most" kind="number" />
            </div>
          </RuleRow>
        </Group>
      </div>
      <div className="grid content-start gap-10">
        <Group id="reading" title="Reading">
          <ReadingRules effects={effects} />
        </Group>
        <Group id="pieces" title="Pieces, all lines">
          <PieceRules effects={effects} />
        </Group>
        <Group id="prediction" title="Prediction">
          <PredictionFields effects={effects} />
        </Group>
      </div>
      <Group id="work" title="Checks of the whole work" className="lg:col-span-2">
        <p className="max-w-[52ch] text-label text-ink-2">
          Judged once for each student. One that nobody records is taken as you say here, or keeps the sheet
          open until somebody does.
        </p>
        <RuleEffect effects={effects} rule="work" />
        <ChecksFields
          base="workChecks"
          checks={draft.workChecks}
          listIn={(next) => next.workChecks}
          emptyText="None. Add one for what is judged once for each student, such as a label."
        />
      </Group>
    </div>
  );
}

interface GroupProps {
  id: string;
  title: string;
  className?: string;
  children: ReactNode;
}

function Group({ id, title, className, children }: GroupProps) {
  return (
    <section aria-labelledby={`${id}-heading`} className={`grid content-start gap-4 ${className ?? ''}`}>
      <Heading id={`${id}-heading`} className="border-b-outline border-ink pb-1">
        {title}
      </Heading>
      {children}
    </section>
  );
}
