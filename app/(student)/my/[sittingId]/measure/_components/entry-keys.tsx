'use client';

import { classNames } from '@/components/ui/class-names';
import { Fraction } from '@/components/ui/fraction';
import type { Unit } from '@/lib/length';
import { DENOMINATOR_KEYS, FRACTION_KEYS, otherUnit } from '@/lib/round/keypad';
import type { MeasuringState } from './use-measuring';

const DIGITS = [...'1234567890'];

const KEYS: Record<Unit, readonly string[]> = {
  in: [...DIGITS, ...FRACTION_KEYS, 'and', '.', 'rub', ...DENOMINATOR_KEYS, 'unit', 'keep'],
  mm: [...DIGITS, '.', 'rub', 'unit', 'keep'],
};

const SPOKEN: Record<string, string> = { rub: 'rub out', '.': 'point' };

/** The bench's keys for a thumb: five in a row. */
export function EntryKeys({ measuring, unit }: { measuring: MeasuringState; unit: Unit }) {
  return (
    <fieldset className="grid grid-cols-5 border-t border-l border-ink">
      <legend className="sr-only">keys</legend>
      {KEYS[unit].map((key) => (
        <button
          key={key}
          type="button"
          // The field keeps the focus, so that keys on the screen and on a keyboard can be mixed.
          onPointerDown={(event) => event.preventDefault()}
          onClick={() => (key === 'keep' ? void measuring.keep() : measuring.key(key))}
          aria-label={key === 'unit' ? `unit, now ${measuring.unit}` : (SPOKEN[key] ?? key)}
          className={classNames(
            'flex min-h-11 touch-manipulation flex-col items-center justify-center border-r border-b border-ink select-none focus-visible:relative focus-visible:z-1 active:bg-ink active:text-sheet',
            key === 'keep' ? 'bg-act text-on-act' : 'bg-plate',
            key === 'keep' && unit === 'mm' && 'col-span-2',
          )}
        >
          <KeyFace text={key} unit={measuring.unit} />
        </button>
      ))}
    </fieldset>
  );
}

function KeyFace({ text, unit }: { text: string; unit: Unit }) {
  if (/^\d$/.test(text)) return <span className="text-[26px] leading-none font-[640]">{text}</span>;
  const fraction = /^(\d)\/(\d)$/.exec(text);
  if (fraction) {
    return (
      <span className="text-[21px] font-[560]">
        <Fraction parts={{ sign: '', whole: '', num: Number(fraction[1]), den: Number(fraction[2]) }} />
      </span>
    );
  }
  if (text === 'keep') return <span className="text-[21px] font-[680]">keep</span>;
  if (text === 'rub') return <span className="narrow text-lead font-[600]">rub out</span>;
  if (text === '.') return <span className="text-[30px] leading-none font-[680]">.</span>;
  if (text === 'unit') {
    return (
      <>
        <span className="text-lead leading-5 font-[620]">{unit}</span>
        <span className="text-small leading-4 text-ink-2">or {otherUnit(unit)}</span>
      </>
    );
  }
  return <span className="text-[20px] font-[560]">{text}</span>;
}
