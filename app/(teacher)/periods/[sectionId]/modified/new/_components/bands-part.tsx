'use client';

import { useState } from 'react';
import { StackedRules } from '@/components/rule/stacked-rules';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { Heading } from '@/components/ui/titles';
import type { DeskSitting } from '@/lib/data/accommodations/read-accommodation-desk';
import { distinctPrices, type PricedSize } from '@/lib/practicals/distinct-prices';
import { faceScale } from '@/lib/practicals/face-scale';
import { excusedAxes, type Modification, modifyRubric } from '@/lib/scoring/modification';
import { formatFactor } from '@/lib/scoring/modification-factor';
import type { Typed } from './use-typed';

/** How much wider the bands are, and the sitting's bands and the modified ones under one scale. */
export function BandsPart({ typed, error }: { typed: Typed; error: string[] | null | undefined }) {
  const [shown, setShown] = useState('');
  const choices = typed.sittings.flatMap((sitting) =>
    distinctPrices(sitting.rubric).map(({ label, sizes }) => ({
      value: `${sitting.sittingId} ${label}`,
      label: typed.sittings.length > 1 ? `${sitting.title}, ${label}` : label,
      sitting,
      size: sizes.find((size) => !isExcused(size, typed.modification)) ?? sizes[0],
    })),
  );
  const choice = choices.find(({ value }) => value === shown) ?? choices[0];
  return (
    <section>
      <Heading className="mb-2">Bands</Heading>
      <div className="mb-4 grid max-w-[44rem] gap-4 sm:grid-cols-2">
        <TextField
          label="times as wide"
          name="widen"
          value={typed.typed.widen}
          onChange={(event) => typed.setWiden(event.target.value)}
          autoComplete="off"
          inputMode="text"
          hint="1.5, 1 1/2 or 150 %; 1 leaves them as they are. The gross limit grows with them."
          error={typed.factorError ?? error}
        />
        {choices.length > 1 ? (
          <SelectField
            label="drawn for"
            options={choices}
            value={choice?.value ?? ''}
            onChange={(event) => setShown(event.target.value)}
          />
        ) : null}
      </div>
      {choice?.size ? (
        <TwoRules
          sitting={choice.sitting}
          lineId={choice.size.lineId}
          axis={choice.size.axis}
          modification={typed.modification}
        />
      ) : (
        <p className="text-label text-ink-2">
          Nothing is given to this period yet. Once it is, the bands are drawn here.
        </p>
      )}
    </section>
  );
}

interface TwoRulesProps {
  sitting: DeskSitting;
  lineId: string;
  axis: 'thickness' | 'width' | 'length';
  modification: Modification | null;
}

function TwoRules({ sitting: { rubric }, lineId, axis, modification }: TwoRulesProps) {
  const line = rubric.lines.find(({ id }) => id === lineId);
  if (!line) return null;
  const modified = modification ? modifyRubric(rubric, modification) : rubric;
  const after = modified.lines.find(({ id }) => id === lineId) ?? line;
  const excused = isExcused({ lineId, axis }, modification);
  const row = (id: string, label: string, note: string, of: typeof line) => ({
    ...{ id, label, note, rule: of.sizes[axis], margin: rubric.margin },
  });
  const rules = [row('sitting', 'the sitting', 'as everybody', line)];
  if (modification && !excused) {
    rules.push(row('modified', 'modified', `${formatFactor(modification.widen)} times`, after));
  }
  const props = { unit: rubric.unit, target: line.target[axis], rules, ...faceScale(modified, after, axis) };
  return (
    <>
      <div className="max-md:hidden">
        <StackedRules {...props} />
      </div>
      <div className="md:hidden">
        <StackedRules {...props} variant="phone" />
      </div>
      <p className="mt-2 text-label text-ink-2">
        Drawn for {line.label}, {axis}. {sayRules(modification, excused)} The bench shows the sitting’s bands.
      </p>
    </>
  );
}

function isExcused({ lineId, axis }: PricedSize, modification: Modification | null): boolean {
  return modification !== null && excusedAxes(lineId, modification).includes(axis);
}

function sayRules(modification: Modification | null, excused: boolean): string {
  if (!modification) return 'The modified bands stand here once everything can be read.';
  if (excused) return 'Excused, whatever is read.';
  const { num, den } = modification.widen;
  return num === den
    ? 'Both are the same until the bands are wider.'
    : 'They differ where the ground is tinted.';
}
