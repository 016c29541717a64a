'use client';

import { PhraseText } from '@/components/ui/phrase-text';
import type { ProposedVariantsView } from '@/lib/data/practicals/propose-variants';
import { TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';
import { reviewRubric } from '@/lib/scoring';
import type { CutList } from '@/lib/scoring/rubric-form';
import type { Proposed } from './use-proposals';

/** The finest that a shop's rule is read to. */
const GRADUATION = { in: TICKS_PER_INCH / 64, mm: TICKS_PER_MM / 2 };

interface ReviewOfVariantProps {
  view: ProposedVariantsView;
  proposed: Proposed;
}

/** What the review says of a variant, and where it leaves the rule of the proposals. */
export function ReviewOfVariant({ view, proposed }: ReviewOfVariantProps) {
  const { unit, original } = view;
  const { remarks } = proposed.judgement;
  const before = new Set(reviewOf(view, original.task.cutList));
  const findings = reviewOf(view, proposed.cutList);
  const own = findings.filter((text) => !before.has(text));
  const shared = findings.length - own.length;
  return (
    <div className="mt-3 border-t border-hair pt-2 text-label" role="status">
      {remarks.map((remark) => (
        <p key={JSON.stringify(remark)} className="mb-1 border-l-edge border-ink pl-3 font-[580]">
          <PhraseText phrase={remark} unit={unit} />
        </p>
      ))}
      {own.map((text) => (
        <p key={text} className="mb-1 border-l-edge border-ink pl-3">
          {text}
        </p>
      ))}
      <p className="text-ink-2">
        {own.length === 0
          ? 'The review finds nothing that the original does not have'
          : 'The rest of the review'}
        {shared > 0 ? `: ${shared} ${shared === 1 ? 'finding' : 'findings'} as there.` : '.'}
      </p>
    </div>
  );
}

function reviewOf({ original: { rubric }, unit }: ProposedVariantsView, { lines }: CutList): string[] {
  const targets = new Map(lines.map(({ id, target }) => [id, target]));
  const priced = rubric.lines.map((line) => ({ ...line, target: targets.get(line.id) ?? line.target }));
  return reviewRubric({ ...rubric, lines: priced }, { graduation: GRADUATION[unit] }).map(({ text }) => text);
}
