'use client';

import { type KeyboardEvent, useId, useRef, useState } from 'react';
import { classNames } from '@/components/ui/class-names';
import { deviationAsText, lengthAsText } from '@/components/ui/length-parts';
import { pointsAsText } from '@/components/ui/points-text';
import type { Length } from '@/lib/length';
import { priceAt, priceSteps, type Side } from './price-steps';
import { RuleFace, type RuleFaceProps } from './rule-face';
import { layOutRule } from './rule-layout';
import { graduationsOf } from './rule-scale';
import { priceBeyond } from './stairs';

interface RuleButtonsProps extends Omit<RuleFaceProps, 'variant' | 'pointers' | 'edges'> {
  onReading: (ticks: Length) => void;
  /** A reading past the shown stretch: the caller opens the keypad. */
  onFar: (side: Side) => void;
}

interface Key {
  id: string;
  left: number;
  name: string;
  press: () => void;
}

function keysOf(props: RuleButtonsProps): Key[] {
  const { unit, target, graduation, span, rule, margin, onReading, onFar } = props;
  const scale = { unit, target, graduation, span };
  const layout = layOutRule('bench', scale);
  const steps = priceSteps(rule, margin);
  const far = (side: Side): Key => {
    const [least, most] = priceBeyond(steps, side, span * graduation);
    const price = least === most ? pointsAsText(most) : `${pointsAsText(least)} to ${pointsAsText(most)}`;
    return {
      id: side,
      left: side === 'under' ? 0 : layout.right,
      name: `far ${side}, by keypad, loses ${price}`,
      press: () => onFar(side),
    };
  };
  const columns = graduationsOf(scale).map(({ step, ticks, deviation }) => ({
    id: String(step),
    left: layout.centre + (step - 0.5) * layout.pitch,
    name: `${lengthAsText(ticks, unit)}, ${deviationAsText(deviation, unit)}, loses ${pointsAsText(priceAt(steps, deviation))}`,
    press: () => onReading(ticks),
  }));
  return [far('under'), ...columns, far('over')];
}

const MOVES: Record<string, (at: number, last: number) => number> = {
  ArrowLeft: (at) => at - 1,
  ArrowRight: (at) => at + 1,
  Home: () => 0,
  End: (_, last) => last,
};

/** The rule as the bench's keys: a whole column is one key, from edge to foot. Arrow keys walk along it. */
export function RuleButtons(props: RuleButtonsProps) {
  const layout = layOutRule('bench', props);
  const keys = keysOf(props);
  const middle = keys.findIndex((key) => key.id === '0');
  const [chosen, setFocused] = useState(middle);
  const focused = Math.min(chosen, keys.length - 1);
  const row = useRef<HTMLDivElement>(null);
  const hint = useId();

  function walk(event: KeyboardEvent) {
    const move = MOVES[event.key];
    if (!move) return;
    event.preventDefault();
    const next = Math.max(0, Math.min(keys.length - 1, move(focused, keys.length - 1)));
    setFocused(next);
    row.current?.querySelectorAll('button')[next]?.focus();
  }

  return (
    <div className={classNames('relative', props.className)}>
      <div aria-hidden="true">
        <RuleFace {...props} className={undefined} variant="bench" />
      </div>
      <div
        ref={row}
        role="toolbar"
        aria-label={props.label ? `rule, ${props.label}` : 'rule'}
        aria-describedby={hint}
        onKeyDown={walk}
        className="absolute inset-x-0 bottom-0"
        style={{ top: `${(layout.edge / layout.height) * 100}%` }}
      >
        {keys.map((key, index) => (
          <button
            key={key.id}
            type="button"
            aria-label={key.name}
            tabIndex={index === focused ? 0 : -1}
            onFocus={() => setFocused(index)}
            onClick={key.press}
            className="absolute inset-y-0 touch-manipulation active:bg-[color-mix(in_srgb,var(--act)_30%,transparent)] focus-visible:-outline-offset-4"
            style={{
              left: `${(key.left / layout.width) * 100}%`,
              width: `${(layout.pitch / layout.width) * 100}%`,
            }}
          />
        ))}
      </div>
      <p id={hint} className="sr-only">
        Arrow keys move one graduation, Enter reads it.
      </p>
    </div>
  );
}
