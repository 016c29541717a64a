'use client';

import { classNames } from '@/components/ui/class-names';
import { Fraction } from '@/components/ui/fraction';
import { DENOMINATOR_KEYS, FRACTION_KEYS } from '@/lib/round/keypad';
import { useBench } from './bench-context';
import { useWide } from './use-wide';

export const KEY_LINES = 'border-b border-rule border-r';

const ROWS: Record<'in' | 'mm', [string, number][][]> = {
  in: [
    [...'12345'].map((digit) => [digit, 1]),
    [...FRACTION_KEYS.map((key): [string, number] => [key, 1]), ['rub', 1]],
    [...'67890'].map((digit) => [digit, 1]),
    [
      ['and', 1],
      ...DENOMINATOR_KEYS.map((key): [string, number] => [key, 1]),
      ['.', 1],
      ['unit', 1],
      ['keep', 2],
    ],
  ],
  mm: [
    [...'12345'].map((digit) => [digit, 2]),
    [
      ['.', 1],
      ['rub', 2],
    ],
    [...'67890'].map((digit) => [digit, 2]),
    [
      ['unit', 1],
      ['keep', 2],
    ],
  ],
};

const SPAN: Record<number, string> = { 1: '', 2: 'lg:col-span-2' };

/** Five in a row on a phone: digits, eighths, what builds finer fractions. */
const PHONE_ORDER = [
  ...'1234567890',
  ...FRACTION_KEYS,
  'and',
  '.',
  'rub',
  ...DENOMINATOR_KEYS,
  'unit',
  'keep',
];

/** Digits, fractions and decimals; every key is at least 15 mm. */
export function Keys() {
  const { view, press } = useBench();
  const wide = useWide();
  const { unit } = view.state.keypad;
  const { rubric } = view.state.plan;
  return ROWS[rubric.unit].flat().map(([key, span]) => (
    <button
      key={key}
      type="button"
      onClick={() => press(key === 'keep' ? { do: 'keep' } : { do: 'key', key })}
      aria-label={key === 'rub' ? 'rub out' : key === 'unit' ? `unit, now ${unit}` : key}
      className={classNames(
        'flex min-h-touch touch-manipulation flex-col items-center justify-center select-none active:bg-ink active:text-sheet focus-visible:relative focus-visible:z-10',
        KEY_LINES,
        SPAN[span],
        key === 'keep' ? 'bg-act text-on-act max-lg:col-span-5' : 'bg-plate',
      )}
      style={wide ? undefined : { order: PHONE_ORDER.indexOf(key) + 1 }}
    >
      <KeyFace text={key} unit={unit} />
    </button>
  ));
}

function KeyFace({ text, unit }: { text: string; unit: 'in' | 'mm' }) {
  if (/^\d$/.test(text)) return <span className="text-[36px] leading-none font-[640]">{text}</span>;
  const fraction = /^(\d)\/(\d)$/.exec(text);
  if (fraction) {
    return (
      <span className="text-[27px] font-[560]">
        <Fraction parts={{ sign: '', whole: '', num: Number(fraction[1]), den: Number(fraction[2]) }} />
      </span>
    );
  }
  if (text === 'keep') return <span className="text-[32px] font-[680]">keep</span>;
  if (text === 'rub') return <span className="narrow text-[22px] font-[600]">rub out</span>;
  if (text === '.') return <span className="text-[40px] leading-none font-[680]">.</span>;
  if (text === 'unit') {
    return (
      <>
        <span className="text-[26px] leading-7 font-[620]">{unit}</span>
        <span className="text-label text-ink-2">or {unit === 'in' ? 'mm' : 'in'}</span>
      </>
    );
  }
  return <span className="text-[26px] font-[560]">{text}</span>;
}
