'use client';

import { createContext, type ReactNode, useContext, useState, useTransition } from 'react';
import { CheckboxField } from '@/components/ui/choice';
import { classNames } from '@/components/ui/class-names';
import type { Length, Unit } from '@/lib/length';
import { inOtherUnit } from '@/lib/practicals/in-other-unit';
import { AXES, type Axis } from '@/lib/scoring';
import { setOtherUnitAction } from './other-unit-action';

interface OtherUnit {
  isOn: boolean;
  turn(isOn: boolean): void;
}

const Context = createContext<OtherUnit>({ isOn: false, turn: () => {} });

/** Lets what is inside show sizes in the other unit too, once the switch is on. */
export function OtherUnitProvider({ isOn, children }: { isOn: boolean; children: ReactNode }) {
  const [shown, setShown] = useState(isOn);
  const [, start] = useTransition();
  function turn(next: boolean) {
    setShown(next);
    start(() => setOtherUnitAction(next));
  }
  return <Context value={{ isOn: shown, turn }}>{children}</Context>;
}

const NAMES: Record<Unit, string> = { in: 'inches', mm: 'millimetres' };

/** The switch, kept on this device, and what the other figures are good for. */
export function OtherUnitSwitch({ unit, className }: { unit: Unit; className?: string }) {
  const { isOn, turn } = useContext(Context);
  return (
    <CheckboxField
      label={`sizes in ${NAMES[unit === 'in' ? 'mm' : 'in']} too`}
      hint={isOn ? `For information; measured and priced in ${NAMES[unit]}.` : undefined}
      checked={isOn}
      onChange={(event) => turn(event.target.checked)}
      className={className}
    />
  );
}

interface OtherLengthProps {
  ticks: Length;
  unit: Unit;
  className?: string;
}

const LOOK = 'tnum whitespace-nowrap text-ink-2';

/** A length in the other unit, exactly or "about"; nothing while the switch is off. */
export function OtherLength({ ticks, unit, className }: OtherLengthProps) {
  const { isOn } = useContext(Context);
  if (!isOn) return null;
  const other = inOtherUnit(ticks, unit);
  return (
    <span className={classNames(LOOK, className)}>
      {other.exact ? '' : 'about '}
      {other.text} {other.unit}
    </span>
  );
}

/** A target in the other unit with what it is, below a drawing; nothing while the switch is off. */
export function TargetInOther({ ticks, unit }: Omit<OtherLengthProps, 'className'>) {
  const { isOn } = useContext(Context);
  if (!isOn) return null;
  return (
    <p className="text-center text-label text-ink-2">
      target: <OtherLength ticks={ticks} unit={unit} className="font-[580] text-ink" />
    </p>
  );
}

interface OtherSizeProps {
  size: Record<Axis, Length>;
  unit: Unit;
  className?: string;
}

/** Thickness × width × length in the other unit; "about" where one of them is. */
export function OtherSize({ size, unit, className }: OtherSizeProps) {
  const { isOn } = useContext(Context);
  if (!isOn) return null;
  const others = AXES.map((axis) => inOtherUnit(size[axis], unit));
  const exact = others.every((other) => other.exact);
  return (
    <span className={classNames(LOOK, className)}>
      {exact ? '' : 'about '}
      {others.map(({ text }, index) => (
        <span key={AXES[index]}>
          {index > 0 ? <span aria-hidden="true"> × </span> : null}
          {index > 0 ? <span className="sr-only"> by </span> : null}
          {text}
        </span>
      ))}{' '}
      {others[0]?.unit}
    </span>
  );
}
