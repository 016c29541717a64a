'use client';

import { type KeyboardEvent, type PointerEvent, useState } from 'react';
import { deviationOf, type PlacedKnife } from '@/components/rule/knife-layout';
import type { RuleLayout } from '@/components/rule/rule-layout';
import { deviationInWords } from '@/components/ui/length-in-words';
import type { EdgeDesk } from './use-edges';

interface KnifeHandlesProps {
  edges: EdgeDesk;
  knives: readonly PlacedKnife[];
  layout: RuleLayout;
  name: string;
}

const KEYS: Record<string, 'less' | 'more' | 'least' | 'most' | 'out' | 'type'> = {
  ArrowLeft: 'less',
  ArrowDown: 'less',
  ArrowRight: 'more',
  ArrowUp: 'more',
  Home: 'least',
  End: 'most',
  Delete: 'out',
  Backspace: 'out',
  Enter: 'type',
};

const percent = (part: number, whole: number) => `${(part / whole) * 100}%`;

/** The band is about to go, and its knife with it: the one inside it takes the cursor. */
function focusInner(knife: HTMLElement, { side, index }: { side: string; index: number }) {
  const inner = knife.parentElement?.querySelector(`[data-edge='${side} ${index - 1}']`);
  if (inner instanceof HTMLElement) inner.focus();
}

/** What the knives on the rule are gripped by: drawn along it by pointer or finger, or moved by keys. */
export function KnifeHandles({ edges, knives, layout, name }: KnifeHandlesProps) {
  const [grip, setGrip] = useState<{ shift: number } | null>(null);
  const { scale } = edges;

  /** Where a pointer is along the rule, as a deviation. */
  function deviationAt(event: PointerEvent<HTMLElement>): number {
    const board = event.currentTarget.parentElement?.getBoundingClientRect();
    if (!board || board.width === 0) return 0;
    const x = ((event.clientX - board.left) / board.width) * layout.width;
    return ((x - layout.centre) / layout.pitch) * scale.graduation;
  }

  function onKeyDown(event: KeyboardEvent<HTMLElement>, knife: { side: 'over' | 'under'; index: number }) {
    const key = KEYS[event.key];
    if (event.key === 'Escape' && edges.drag) {
      event.preventDefault();
      edges.dropDrag();
    }
    if (!key || event.altKey || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    if (key === 'out') {
      focusInner(event.currentTarget, knife);
      edges.takeOut(knife);
    }
    if (key === 'type') edges.typeInto(knife);
    if (key === 'least' || key === 'most') edges.moveToEnd(knife, key);
    if (key === 'less' || key === 'more') edges.step(knife, key === 'more' ? 1 : -1, event.shiftKey);
  }

  return knives.map(({ edge, tab }, place) => {
    const knife = { side: edge.side, index: edges.indexOf(place) };
    const [least, most] = edges.room(knife);
    return (
      <div
        key={`${knife.side}${knife.index}`}
        role="slider"
        data-edge={`${knife.side} ${knife.index}`}
        tabIndex={0}
        aria-label={`${knife.side}, ${name}, edge of band ${knife.index + 1}`}
        aria-valuemin={least}
        aria-valuemax={most}
        aria-valuenow={edges.valueOf(knife)}
        aria-valuetext={deviationInWords(deviationOf(edges.edgeAt(knife)), scale.unit)}
        aria-keyshortcuts={knife.index > 0 ? 'Delete' : undefined}
        onKeyDown={(event) => onKeyDown(event, knife)}
        onFocus={() => edges.hold(knife)}
        onBlur={() => edges.hold(null)}
        onPointerDown={(event) => {
          if (event.button !== 0) return;
          event.currentTarget.setPointerCapture(event.pointerId);
          event.currentTarget.focus();
          setGrip({ shift: deviationOf(edges.edgeAt(knife)) - deviationAt(event) });
          edges.startDrag(knife);
        }}
        onPointerMove={(event) => {
          if (grip && edges.drag) edges.dragTo(deviationAt(event) + grip.shift);
        }}
        onPointerUp={() => {
          setGrip(null);
          edges.endDrag();
        }}
        onPointerCancel={() => {
          setGrip(null);
          edges.dropDrag();
        }}
        className="absolute min-h-6 min-w-6 cursor-ew-resize touch-none outline-none select-none"
        style={{
          left: percent(tab.x, layout.width),
          top: percent(tab.y - 4, layout.height),
          width: percent(tab.width, layout.width),
          height: percent(tab.height + 8, layout.height),
        }}
      />
    );
  });
}
