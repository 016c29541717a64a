'use client';

import { StripBar } from '@/components/rule/deviation-strip';
import { sideOf } from '@/components/rule/price-steps';
import { classNames } from '@/components/ui/class-names';
import { Fraction, LengthText } from '@/components/ui/fraction';
import { deviationAsText, lengthParts } from '@/components/ui/length-parts';
import { pointsAsText } from '@/components/ui/points-text';
import { parseLength } from '@/lib/length';
import { DENOMINATOR_KEYS, FRACTION_KEYS } from '@/lib/round/keypad';
import { findPiece } from '@/lib/round/pieces';
import { priceSize } from '@/lib/round/price-size';
import { type Graduation, neighbours } from '@/lib/round/rule-scale';
import { useBench } from './bench-context';
import { useWide } from './use-wide';

/** Neighbours of the target first, one tap each; then the keys. What is typed is what is kept. */
export function KeypadEntry({ why }: { why?: string }) {
  return (
    <section aria-label="keypad" className="border-outline border-t-edge border-ink">
      <div className="grid grid-cols-5 lg:grid-cols-13">
        <Neighbours />
        <Display why={why} />
        <Keys />
      </div>
    </section>
  );
}

const LINE = 'border-b border-rule border-r';

function Neighbours() {
  const { view, press } = useBench();
  const { spot, plan } = view.state;
  const place = spot && findPiece(plan.rubric, spot);
  if (!spot || !place) return <div className={classNames('col-span-5 lg:col-span-9', LINE)} />;
  const { unit } = plan.rubric;
  return neighbours(plan.rubric, place.line, spot.axis).map((each) => (
    <button
      key={each.ticks}
      type="button"
      onClick={() =>
        press({ do: 'read', reading: { ticks: each.ticks, typed: each.text, unit, instrument: 'keyed' } })
      }
      aria-label={`${each.text}, ${deviationAsText(each.deviation, unit)}, loses ${pointsAsText(each.lose)}`}
      className={classNames(
        'flex min-h-touch touch-manipulation flex-col items-center justify-center select-none active:bg-ink active:text-sheet focus-visible:relative focus-visible:z-10',
        LINE,
        each.deviation === 0 ? 'bg-act-wash text-act' : 'bg-plate',
        Math.abs(each.deviation) > 0 && isOuter(each) && 'max-lg:hidden',
      )}
    >
      <span className="narrow text-[30px] leading-8 font-[600]">
        <Fraction parts={lengthParts(each.ticks, unit)} />
      </span>
      {each.deviation === 0 ? (
        <span className="text-text font-[620]">target</span>
      ) : (
        <span className="narrow text-[20px] leading-5 opacity-80">
          <Fraction parts={lengthParts(each.deviation, unit, {}, true)} />
        </span>
      )}
      <svg aria-hidden="true" viewBox="0 0 72 10" className="h-[10px] w-[72px]">
        <StripBar
          side={sideOf(each.deviation)}
          lose={each.lose}
          centre={36}
          top={1}
          height={8}
          length={Math.min(34, each.lose / 9)}
        />
      </svg>
    </button>
  ));

  function isOuter({ deviation }: Graduation): boolean {
    const all = neighbours(
      plan.rubric,
      place?.line ?? plan.rubric.lines[0] ?? never(),
      spot?.axis ?? 'length',
    );
    const step = Math.abs(all[1] && all[0] ? all[1].deviation - all[0].deviation : 1);
    return Math.abs(deviation) > 2 * step;
  }
}

function never(): never {
  throw new Error('a rubric has at least one line');
}

/** What has been typed, and what it would lose. */
function Display({ why }: { why: string | undefined }) {
  const { view, typing } = useBench();
  const { spot, plan, keypad } = view.state;
  const { rubric } = plan;
  const place = spot && findPiece(rubric, spot);
  const text = typing || keypad.text;
  const parsed = parseLength(text, keypad.unit);
  const price =
    parsed.ok && parsed.ticks > 0 && place && spot
      ? priceSize(rubric, place.line, spot.axis, parsed.ticks)
      : null;
  return (
    <div className="col-span-5 flex min-h-touch items-center justify-between gap-3 border-b-edge border-act bg-sheet px-4 lg:col-span-4">
      <div className="narrow text-lead leading-6">
        {price && parsed.ok && place && spot ? (
          <>
            <span className="block font-[600]">
              <LengthText ticks={parsed.ticks - place.line.target[spot.axis]} unit={rubric.unit} signed />
            </span>
            <span className={price.gross ? 'font-[640] text-refuse' : 'text-ink-2'}>
              {price.gross ? 'past the gross limit' : `loses ${pointsAsText(price.lose)}`}
            </span>
          </>
        ) : (
          <span className="text-ink-2">{why ?? ''}</span>
        )}
      </div>
      <output
        aria-label="typed"
        className="narrow border-r-edge border-act pr-2 text-[42px] leading-none font-[620] whitespace-nowrap"
      >
        {parsed.ok && !/[ /]$/.test(text) ? <Fraction parts={typedParts(text)} /> : text}
        <span className="text-lead font-[440] text-ink-2"> {keypad.unit}</span>
      </output>
    </div>
  );
}

/** The typed text set as a fraction, without reducing it: 4/8 stays 4/8. */
function typedParts(text: string) {
  const match = /^(?:(\d+) )?(\d+)\/(\d+)$/.exec(text);
  return {
    sign: '' as const,
    whole: match ? (match[1] ?? '') : text,
    num: match ? Number(match[2]) : null,
    den: match ? Number(match[3]) : null,
  };
}

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

function Keys() {
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
        LINE,
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
