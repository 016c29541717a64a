'use client';

import { type ReactNode, useState } from 'react';
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
import { type EdgeDesk, useEdges } from './use-edges';
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
  reading: { deviation: Length; price: string; said: ReactNode; onMove(deviation: Length): void } | null;
}

/** A price on its rule: its edges are knives, its prices stand on the steps, a reading slides along its foot. */
export function PriceOnRule(props: PriceOnRuleProps) {
  const { desk } = useEditor();
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
      {reading ? (
        <ReadingTrack
          deviation={reading.deviation}
          price={reading.price}
          onMove={reading.onMove}
          {...{ scale, layout, name }}
        />
      ) : null}
      {reading ? <output className="mt-1 block min-h-7 text-lead font-[620]">{reading.said}</output> : null}
      <div className="mt-1 flex flex-wrap items-baseline justify-between gap-x-8 gap-y-1 text-small text-ink-2">
        {size.isOwn ? <EdgeNews edges={edges} /> : null}
        {margin > 0 ? (
          <p>
            reading margin <LengthText ticks={margin} unit={unit} />: each price begins this far past its edge
          </p>
        ) : null}
      </div>
    </>
  );
}

/** What was just done to the bands, with the way back; else how they are moved. */
function EdgeNews({ edges }: { edges: EdgeDesk }) {
  const { drag, news } = edges;
  if (!drag && !news) {
    return (
      <p>
        Draw a knife along the rule: it stops at its neighbours, and laid on one it takes the band between
        out. Press the stair to strike another.
      </p>
    );
  }
  return (
    <p className="flex min-h-6 flex-wrap items-center gap-x-2 text-ink">
      <output>{drag?.onto != null ? 'Let go here and the band between is taken out.' : news?.text}</output>
      {news?.before && !drag ? (
        <Button kind="quiet" size="small" className="min-h-6 px-0 py-0" onClick={edges.takeBack}>
          take that back
        </Button>
      ) : null}
    </p>
  );
}
