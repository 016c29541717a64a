import type { ReactNode } from 'react';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import { totalPoints } from '@/lib/practicals/both-scales';
import type { Policies, Rubric } from '@/lib/scoring';
import { PointsInBoth } from '../../_components/points-in-both';
import { CheckRules } from './check-rules';
import { PredictionRule } from './prediction-rule';

interface RulesOfTaskProps {
  rubric: Rubric;
  policies: Policies;
}

/** Everything but the sizes that can cost or bring points, in plain sentences. */
export function RulesOfTask({ rubric, policies }: RulesOfTaskProps) {
  return (
    <section>
      <Heading className="border-b-outline border-ink pb-1">Besides the sizes</Heading>
      <dl className="[&>dd]:max-w-[62ch] [&>dd]:pb-3 [&>dt]:border-hair [&>dt]:pt-3 [&>dt]:font-[660] [&>dt:not(:first-child)]:border-t">
        <CheckRules rubric={rubric} />
        <dt>a missing piece</dt>
        <dd>
          <MissingRule rubric={rubric} />
        </dd>
        {rubric.grossLimit === null ? null : (
          <>
            <dt>far off</dt>
            <dd>
              A piece with a size more than{' '}
              <LengthText ticks={rubric.grossLimit} unit={rubric.unit} withUnit /> off is not that part any
              more: it loses all it is worth. Cut it again while there is stock.
            </dd>
          </>
        )}
        <SetRules rubric={rubric} />
        <dt>your prediction</dt>
        <dd>
          <PredictionRule rubric={rubric} policy={policies.prediction} />
        </dd>
        <dt>a redo</dt>
        <dd>
          <RedoRule rubric={rubric} redo={policies.redo} />
        </dd>
        <dt>late work</dt>
        <dd>
          {policies.late
            ? `Each day late takes ${policies.late.perDay} % off the score, ${policies.late.max} % at most.`
            : 'The days are recorded. They cost nothing.'}
        </dd>
      </dl>
    </section>
  );
}

function MissingRule({ rubric }: { rubric: Rubric }) {
  const [first] = rubric.lines;
  if (first && rubric.lines.every(({ missing }) => missing === first.missing)) {
    return (
      <>
        It loses <PointsInBoth rubric={rubric} points={first.missing} />
        {rubric.lines.every(({ missing, worth }) => missing === worth)
          ? ', all it is worth. A poor piece loses no more than that.'
          : '.'}
      </>
    );
  }
  return rubric.lines.map(({ id, label, missing }) => (
    <span key={id} className="block">
      {label}: <PointsInBoth rubric={rubric} points={missing} />
    </span>
  ));
}

function SetRules({ rubric }: { rubric: Rubric }): ReactNode {
  const sets = rubric.lines.filter(({ set, quantity }) => set === 'worst' && quantity > 1);
  if (sets.length === 0) return null;
  return (
    <>
      <dt>pieces that must match</dt>
      <dd>{sets.map(({ label }) => label).join(', ')}: each loses as much as the worst of them.</dd>
    </>
  );
}

function RedoRule({ rubric, redo }: { rubric: Rubric; redo: Policies['redo'] }) {
  if (redo.kind === 'average') return 'If you may redo it, the mean of your attempts counts.';
  const which = redo.kind === 'higher' ? 'the higher score counts' : 'the last score counts';
  const most = (totalPoints(rubric) * redo.capPercent) / 100;
  return (
    <>
      If you may redo it, {which}
      {redo.capPercent < 100
        ? `; a redo brings at most ${pointsAsText(most)} of ${pointsAsText(totalPoints(rubric))}, or what your first attempt had if that was more`
        : ''}
      . Only pieces that lost points need to be cut again.
    </>
  );
}
