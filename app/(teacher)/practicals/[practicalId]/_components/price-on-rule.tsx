'use client';

import { useState } from 'react';
import { RuleFace } from '@/components/rule/rule-face';
import { LengthText } from '@/components/ui/fraction';
import { ruleScaleOf } from '@/lib/practicals/rule-scale-of';
import type { Axis, SizeRule } from '@/lib/scoring';
import { useEditor } from './editor-context';
import { type HeldEdge, KnifeHandles } from './knife-handles';
import { marginOf } from './read-draft';
import type { SizeRuleDesk } from './use-size-rule';

export const OFF: Record<Axis, [under: string, over: string]> = {
  thickness: ['thin', 'thick'],
  width: ['narrow', 'wide'],
  length: ['short', 'long'],
};

interface PriceOnRuleProps {
  size: SizeRuleDesk;
  rule: SizeRule;
  axis: Axis;
  target: number;
  name: string;
}

/** Every second graduation is numbered on a phone; an odd span keeps the outermost number off the paper's edge. */
function oddSpan(span: number): number {
  return span % 2 === 0 ? span - 1 : span;
}

/** A price on its rule. Where there is room the band edges stand on it as knives, and are moved there. */
export function PriceOnRule({ size, rule, axis, target, name }: PriceOnRuleProps) {
  const { desk, unit } = useEditor();
  const [held, setHeld] = useState<HeldEdge | null>(null);
  const [kept, setKept] = useState<ReturnType<typeof ruleScaleOf> | null>(null);
  const margin = marginOf(desk.draft);
  const [under, over] = OFF[axis];
  const fitting = ruleScaleOf([rule], unit);
  const scale = { unit, target, ...(kept ?? fitting) };
  const face = { ...scale, rule, margin, label: name };
  const edges = (['under', 'over'] as const).flatMap((side) =>
    rule[side].map(({ within }, index) => ({
      side,
      within,
      inHand: held !== null && held.index === index && (size.rule.mirrored || held.side === side),
    })),
  );
  return (
    <div className="@container">
      <div className="flex justify-between text-label @min-[920px]:-mb-5">
        <span>− under: {under}</span>
        <span>over: {over} +</span>
      </div>
      <div className="@min-[560px]:hidden">
        <RuleFace {...face} span={oddSpan(scale.span)} variant="phone" />
      </div>
      <div className="hidden @min-[560px]:block @min-[920px]:hidden">
        <RuleFace {...face} variant="card" />
      </div>
      <div className="relative hidden @min-[920px]:block">
        <RuleFace {...face} edges={edges} variant="wide" />
        {size.isOwn ? (
          <KnifeHandles
            {...{ size, rule, scale, name }}
            onHold={setHeld}
            onDrag={(dragged) => setKept(dragged ? fitting : null)}
          />
        ) : null}
      </div>
      {margin > 0 ? (
        <p className="mt-1 text-small text-ink-2">
          reading margin <LengthText ticks={margin} unit={unit} />: each price begins this far past its edge
        </p>
      ) : null}
    </div>
  );
}
