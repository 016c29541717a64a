'use client';

import { type KeyboardEvent, type PointerEvent, useState } from 'react';
import { placeOnFace, type RuleLayout } from '@/components/rule/rule-layout';
import { RuleNumber } from '@/components/rule/rule-number';
import { CrowsFoot } from '@/components/rule/rule-pointers';
import type { RuleScale } from '@/components/rule/rule-scale';
import { classNames } from '@/components/ui/class-names';
import { deviationInWords, lengthInWords } from '@/components/ui/length-in-words';
import { lengthParts } from '@/components/ui/length-parts';
import type { Length } from '@/lib/length';
import { coarserStep } from '@/lib/practicals/band-edges';

interface ReadingTrackProps {
  deviation: Length;
  onMove(deviation: Length): void;
  scale: RuleScale;
  layout: RuleLayout;
  name: string;
  /** "loses 2" for who does not see the drawing. */
  price: string;
}

const HEIGHT = 56;
const TAB = { width: 76, height: 30 };

const percent = (part: number, whole: number) => `${(part / whole) * 100}%`;

/** A reading slid along the foot of the rule: by pointer or finger, or by keys, a graduation at a time. */
export function ReadingTrack({ deviation, onMove, scale, layout, name, price }: ReadingTrackProps) {
  const [dragged, setDragged] = useState(false);
  const [focused, setFocused] = useState(false);
  const { graduation, span, target, unit } = scale;
  const most = span * graduation;
  const least = Math.max(-most, graduation - target);
  const x = placeOnFace(deviation, scale, layout);
  const hold = (next: Length) => onMove(Math.min(most, Math.max(least, next)));

  function onKeyDown(event: KeyboardEvent) {
    const step = graduation * (event.shiftKey ? coarserStep(graduation, unit) : 1);
    const next: Record<string, Length> = {
      ArrowLeft: (Math.ceil(deviation / step) - 1) * step,
      ArrowDown: (Math.ceil(deviation / step) - 1) * step,
      ArrowRight: (Math.floor(deviation / step) + 1) * step,
      ArrowUp: (Math.floor(deviation / step) + 1) * step,
      Home: least,
      End: most,
    };
    const to = next[event.key];
    if (to === undefined || event.altKey || event.ctrlKey || event.metaKey) return;
    event.preventDefault();
    hold(to);
  }

  function moveTo(event: PointerEvent<HTMLElement>) {
    const box = event.currentTarget.getBoundingClientRect();
    const at = ((event.clientX - box.left) / box.width) * layout.width;
    hold(Math.round((at - layout.centre) / layout.pitch) * graduation);
  }

  return (
    <div
      role="slider"
      tabIndex={0}
      aria-label={`a reading of ${name}`}
      aria-valuemin={Math.round(least / graduation)}
      aria-valuemax={span}
      aria-valuenow={deviation / graduation}
      aria-valuetext={`${lengthInWords(target + deviation, unit)}, ${deviationInWords(deviation, unit)}, ${price}`}
      onKeyDown={onKeyDown}
      onFocus={() => setFocused(true)}
      onBlur={() => setFocused(false)}
      onPointerDown={(event) => {
        if (event.button !== 0) return;
        event.currentTarget.setPointerCapture(event.pointerId);
        setDragged(true);
        moveTo(event);
      }}
      onPointerMove={(event) => {
        if (dragged) moveTo(event);
      }}
      onPointerUp={() => setDragged(false)}
      onPointerCancel={() => setDragged(false)}
      className="relative block cursor-ew-resize touch-none outline-none select-none"
    >
      <svg
        aria-hidden="true"
        viewBox={`0 0 ${layout.width} ${HEIGHT}`}
        className="block h-auto w-full overflow-visible"
      >
        <path
          d={deviation === 0 || Math.abs(deviation) > most ? '' : `M${x} ${-layout.body * 0.42}V0`}
          className={classNames('[stroke-width:var(--pen-outline)]', focused ? 'stroke-act' : 'stroke-ink')}
        />
        <path
          d={`M0 ${HEIGHT - 4 - TAB.height / 2}H${layout.width}`}
          strokeDasharray="2 5"
          className="stroke-rule [stroke-width:var(--pen-inside)]"
        />
        {Math.abs(deviation) > most ? (
          <PastTheEnd x={x} out={deviation < 0 ? -1 : 1} />
        ) : (
          <g transform={`translate(${x} 2) scale(1 -1)`}>
            <CrowsFoot kind="bench" x={0} y={0} size={18} />
          </g>
        )}
        <ReadingTab {...{ x, deviation, scale, layout, focused }} />
      </svg>
      <span
        aria-hidden
        className="absolute bottom-0 left-0 bg-sheet pr-2 text-label leading-7"
        style={{ visibility: x < layout.width * 0.24 ? 'hidden' : undefined }}
      >
        slide a reading
      </span>
      <span
        aria-hidden
        className="absolute top-0 h-full min-w-11 -translate-x-1/2"
        style={{ left: percent(x, layout.width) }}
      />
    </div>
  );
}

/** The reading lies further out than the rule that is shown. */
function PastTheEnd({ x, out }: { x: number; out: 1 | -1 }) {
  return (
    <path
      d={`M${x - out * 22} 12H${x - out * 3}M${x - out * 11} 4l${out * 8} 8l${-out * 8} 8`}
      className="fill-none stroke-ink [stroke-width:var(--pen-edge)]"
    />
  );
}

interface ReadingTabProps {
  x: number;
  deviation: Length;
  scale: RuleScale;
  layout: RuleLayout;
  focused: boolean;
}

/** The deviation under the pointer; past the end of the rule it says so by an arrow. */
function ReadingTab({ x, deviation, scale, layout, focused }: ReadingTabProps) {
  const left = Math.min(layout.width - TAB.width, Math.max(0, x - TAB.width / 2));
  const top = HEIGHT - TAB.height - 2;
  const middle = left + TAB.width / 2;
  return (
    <g>
      <rect
        x={left}
        y={top}
        width={TAB.width}
        height={TAB.height}
        className={classNames(
          '[stroke-width:var(--pen-outline)]',
          focused ? 'fill-act stroke-act' : 'fill-ink stroke-ink',
        )}
      />
      {focused ? (
        <path
          d={`M${left - 8} ${top + 7}l-8 8l8 8M${left + TAB.width + 8} ${top + 7}l8 8l-8 8`}
          className="fill-none stroke-act [stroke-width:calc(var(--pen-edge)*0.9)]"
        />
      ) : null}
      {deviation === 0 ? (
        <text
          x={middle}
          y={top + 21}
          fontSize={18}
          className={`font-[600] [text-anchor:middle] ${focused ? 'fill-on-act' : 'fill-sheet'}`}
        >
          target
        </text>
      ) : (
        <RuleNumber
          parts={lengthParts(deviation, scale.unit, {}, true)}
          x={middle}
          baseline={top + 23}
          size={22}
          className={focused ? 'fill-on-act' : 'fill-sheet'}
        />
      )}
    </g>
  );
}
