'use client';

import { useState } from 'react';
import type { KnifeEdge } from '@/components/rule/knife-layout';
import type { RuleScale } from '@/components/rule/rule-scale';
import type { Length, Unit } from '@/lib/length';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import {
  addEdge,
  coarserStep,
  drawEdge,
  holdEdge,
  joinBands,
  sideOfRule,
  stepEdge,
  takeOutBand,
} from '@/lib/practicals/band-edges';
import type { DraftSide, DraftSizeRule } from '@/lib/practicals/draft';
import type { SizeRule } from '@/lib/scoring';
import { fieldId } from './editor-context';
import type { SizeRuleDesk } from './use-size-rule';

export interface HeldEdge {
  side: 'over' | 'under';
  index: number;
}

/** What was just done to the bands, and how they were before, so that it can be taken back. */
export interface EdgeNews {
  text: string;
  before: DraftSizeRule | null;
}

interface Drag {
  edge: HeldEdge;
  before: DraftSizeRule;
  onto: number | null;
}

function edgesOf(rule: SizeRule, side: HeldEdge['side']): HeldEdge[] {
  return rule[side].map((_, index) => ({ side, index }));
}

const isSame = (a: HeldEdge | null, b: HeldEdge) => a?.side === b.side && a.index === b.index;

/** The band edges of one price on its rule: drawn, stepped, added and taken out. A knife stops at its neighbours. */
export function useEdges(size: SizeRuleDesk, rule: SizeRule, scale: RuleScale) {
  const [held, hold] = useState<HeldEdge | null>(null);
  const [drag, setDrag] = useState<Drag | null>(null);
  const [news, setNews] = useState<EdgeNews | null>(null);
  // The outermost tab needs a graduation's room on the paper.
  const reach = { graduation: scale.graduation, span: scale.span - 1 };
  const { mirrored } = size.rule;
  /** Where both sides are alike, the over side is the one that is written. */
  const written = (side: HeldEdge['side']) => (mirrored ? 'over' : side);
  const bandsOf = ({ side }: HeldEdge) => rule[side];
  // From left to right, as they lie on the rule.
  const list = [...edgesOf(rule, 'under').reverse(), ...edgesOf(rule, 'over')];

  function moveTo({ side, index }: HeldEdge, within: Length) {
    if (within === rule[side][index]?.within) return;
    size.change((each) => {
      const band = each[written(side)].bands[index];
      if (band) band.within = lengthAsTyped(within, scale.unit);
    });
  }

  function restore(before: DraftSizeRule) {
    size.change((each) => Object.assign(each, structuredClone(before)));
  }

  function endDrag() {
    if (drag?.onto != null) {
      const { edge, onto, before } = drag;
      size.change((each) => {
        const side = written(edge.side);
        each[side] = joinBands(each[side], edge.index, onto);
      });
      setNews({ text: 'A band is taken out.', before });
    }
    setDrag(null);
  }

  function knivesOf(): KnifeEdge[] {
    return list.map((edge) => {
      const inHand = isSame(held, edge) || (mirrored && held?.index === edge.index);
      const laidOn =
        drag?.onto != null && (isSame(drag.edge, edge) || (mirrored && drag.edge.index === edge.index))
          ? bandsOf(edge)[drag.onto]?.within
          : undefined;
      const within = laidOn ?? bandsOf(edge)[edge.index]?.within ?? 0;
      return { side: edge.side, within, inHand, onNeighbour: laidOn !== undefined };
    });
  }

  return {
    scale,
    drag,
    news,
    hold,
    knives: knivesOf(),
    indexOf: (place: number) => list[place]?.index ?? 0,
    edgeAt: (edge: HeldEdge) => ({ side: edge.side, within: bandsOf(edge)[edge.index]?.within ?? 0 }),
    valueOf: (edge: HeldEdge) =>
      ((edge.side === 'under' ? -1 : 1) * (bandsOf(edge)[edge.index]?.within ?? 0)) / scale.graduation,
    /** Least and most of its value, which grows from left to right. */
    room(edge: HeldEdge): [least: number, most: number] {
      const ends = [0, reach.span * scale.graduation].map(
        (distance) => holdEdge(bandsOf(edge), edge.index, distance, reach) / scale.graduation,
      );
      const [near = 0, far = 0] = ends;
      return edge.side === 'under' ? [-far, -near] : [near, far];
    },
    step(edge: HeldEdge, direction: 1 | -1, isCoarse: boolean) {
      const outwards = edge.side === 'over' ? direction : -direction;
      const steps = outwards * (isCoarse ? coarserStep(scale.graduation, scale.unit) : 1);
      moveTo(edge, stepEdge(bandsOf(edge), edge.index, steps, reach));
    },
    moveToEnd(edge: HeldEdge, end: 'least' | 'most') {
      const isFar = (end === 'most') === (edge.side === 'over');
      moveTo(edge, holdEdge(bandsOf(edge), edge.index, isFar ? reach.span * scale.graduation : 0, reach));
    },
    typeInto({ side, index }: HeldEdge) {
      document.getElementById(fieldId(`${size.base}.${written(side)}.bands.${index}.within`))?.focus();
    },
    takeOut({ side, index }: HeldEdge) {
      if (index === 0) {
        setNews({ text: 'The free band stays: it is where nothing is lost.', before: null });
        return;
      }
      setNews({ text: 'A band is taken out.', before: structuredClone(size.rule) });
      size.change((each) => {
        each[written(side)] = takeOutBand(each[written(side)], index);
      });
    },
    startDrag: (edge: HeldEdge) => setDrag({ edge, before: structuredClone(size.rule), onto: null }),
    dragTo(deviation: number) {
      if (!drag) return;
      const distance = drag.edge.side === 'under' ? -deviation : deviation;
      const place = drawEdge(bandsOf(drag.edge), drag.edge.index, distance, reach);
      if ('within' in place) moveTo(drag.edge, place.within);
      const onto = 'onto' in place ? place.onto : null;
      if (onto !== drag.onto) setDrag({ ...drag, onto });
    },
    endDrag,
    dropDrag() {
      if (drag) restore(drag.before);
      setDrag(null);
    },
    /** One more edge where the stair was pressed. */
    add(deviation: Length) {
      const side = deviation < 0 ? 'under' : 'over';
      const at = Math.abs(deviation);
      const typed = size.rule[written(side)];
      const next = addEdge(typed, sideOfRule(rule, side), at, scale.unit);
      if (!next) return;
      setNews({ text: addedWords(typed, next, at, scale.unit), before: structuredClone(size.rule) });
      size.change((each) => {
        each[written(side)] = structuredClone(next);
      });
    },
    takeBack() {
      if (news?.before) restore(news.before);
      setNews(null);
    },
  };
}

/** "A band to 1/8 is added: it loses 3, and what lies past it 4." */
function addedWords(before: DraftSide, after: DraftSide, at: Length, unit: Unit): string {
  const place = after.bands.findIndex((band, index) => band.within !== before.bands[index]?.within);
  const band = after.bands[place];
  const inner = `A band to ${lengthAsTyped(at, unit)} is added`;
  if (place === 0) return `${inner}: past it, ${after.bands[1]?.lose} is lost.`;
  if (after.beyond === before.beyond) return `${inner}: it loses ${band?.lose}.`;
  return `${inner}: it loses ${band?.lose}, and what lies past it ${after.beyond}.`;
}

export type EdgeDesk = ReturnType<typeof useEdges>;
