'use client';

import { useState } from 'react';
import { layOutKnives } from '@/components/rule/knife-layout';
import { RuleFace } from '@/components/rule/rule-face';
import type { RuleVariant } from '@/components/rule/rule-layout';
import { Button } from '@/components/ui/button';
import { LengthText } from '@/components/ui/fraction';
import type { Length } from '@/lib/length';
import { ruleScaleOf } from '@/lib/practicals/rule-scale-of';
import type { Axis, SizeRule } from '@/lib/scoring';
import { useEditor } from './editor-context';
import { KnifeHandles } from './knife-handles';
import { marginOf } from './read-draft';
import { ReadingTrack } from './reading-track';
import { StairFields } from './stair-fields';
import { useEdges } from './use-edges';
import type { SizeRuleDesk } from './use-size-rule';

export const OFF: Record<Axis, [under: string, over: string]> = {
  thickness: ['thin', 'thick'],
  width: ['narrow', 'wide'],
  length: ['short', 'long'],
};

/** How the rule is cut for the room there is, and how far it reaches past the last band. */
const CUTS: { variant: RuleVariant; room: number; shown: string }[] = [
  { variant: 'phone', room: 2, shown: '@min-[560px]:hidden' },
  { variant: 'card', room: 3, shown: 'hidden @min-[560px]:block @min-[860px]:hidden' },
  { variant: 'wide', room: 3, shown: 'hidden @min-[860px]:block' },
];

interface PriceOnRuleProps {
  size: SizeRuleDesk;
  rule: SizeRule;
  axis: Axis;
  target: Length;
  name: string;
  /** A reading to try on it; none while the draft cannot be priced. */
  reading: { deviation: Length; price: string; onMove(deviation: Length): void } | null;
}

/** A price on its rule: its edges are knives, its prices stand on the steps, a reading slides along its foot. */
export function PriceOnRule(props: PriceOnRuleProps) {
  const { desk, unit } = useEditor();
  const margin = marginOf(desk.draft);
  const [under, over] = OFF[props.axis];
  return (
    <div className="@container">
      <div className="flex justify-between text-label @min-[860px]:-mb-5">
        <span>− under: {under}</span>
        <span>over: {over} +</span>
      </div>
      {CUTS.map(({ variant, room, shown }) => (
        <div key={variant} className={shown}>
          <RuleBoard {...props} {...{ variant, room, margin }} />
        </div>
      ))}
      {margin > 0 ? (
        <p className="mt-1 text-small text-ink-2">
          reading margin <LengthText ticks={margin} unit={unit} />: each price begins this far past its edge
        </p>
      ) : null}
    </div>
  );
}

interface RuleBoardProps extends PriceOnRuleProps {
  variant: RuleVariant;
  room: number;
  margin: Length;
}

function RuleBoard({ size, rule, target, name, reading, variant, room, margin }: RuleBoardProps) {
  const { unit } = useEditor();
  const [kept, setKept] = useState<ReturnType<typeof ruleScaleOf> | null>(null);
  const fitting = ruleScaleOf([rule], unit, room);
  const scale = { unit, target, ...(kept ?? fitting) };
  const edges = useEdges(size, rule, scale);
  // While an edge is drawn the stretch of rule stays as it is.
  if (edges.drag && !kept) setKept(fitting);
  if (!edges.drag && kept) setKept(null);
  const { layout, knives } = layOutKnives(variant, scale, edges.knives);
  const face = { ...scale, rule, margin, variant, label: name };
  return (
    <>
      <div className="relative">
        <RuleFace {...face} edges={edges.knives} showPriceNumbers={false} />
        <StairFields {...{ size, edges, rule, margin, layout, name }} />
        {size.isOwn ? <KnifeHandles {...{ edges, knives, layout, name }} /> : null}
      </div>
      {reading ? <ReadingTrack {...reading} {...{ scale, layout, name }} /> : null}
      {size.isOwn ? (
        <p className="mt-1 flex min-h-6 flex-wrap items-center gap-x-2 text-small text-ink-2">
          <output>
            {edges.drag?.onto != null ? 'Let go here and the band between is taken out.' : edges.news?.text}
          </output>
          {edges.news?.before && !edges.drag ? (
            <Button kind="quiet" size="small" className="min-h-6 px-0 py-0" onClick={edges.takeBack}>
              take that back
            </Button>
          ) : null}
          {edges.news || edges.drag ? null : (
            <span>
              Draw a knife along the rule; laid on its neighbour, it takes the band between out. Press the
              stair to strike another.
            </span>
          )}
        </p>
      ) : null}
    </>
  );
}
