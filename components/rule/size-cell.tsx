import { classNames } from '@/components/ui/class-names';
import { type LengthParts, lengthParts } from '@/components/ui/length-parts';
import { pointsAsText } from '@/components/ui/points-text';
import type { Length, Unit } from '@/lib/length';
import type { Points } from '@/lib/scoring';
import { type CellReading, type CellState, cellInWords } from './cell-state';
import { StripBar } from './deviation-strip';
import { sideOf } from './price-steps';
import { numberWidth } from './rule-layout';
import { RuleNumber } from './rule-number';

interface SizeCellProps {
  state: CellState;
  target: Length;
  unit: Unit;
  /** The cell in hand. */
  cursor?: boolean;
  /** Leave the words out where the caller's control says them. */
  silent?: boolean;
  className?: string;
}

const SIDE = 78;
const MIDDLE = SIDE / 2;
const POINTS_FILL_HALF = 300;
const HALF_STRIP = 28;

/** The size that makes a number at most so wide. */
function fitted(parts: LengthParts, most: number, room: number): number {
  const fraction = parts.num === null ? '' : `${parts.num}/${parts.den}`;
  const grow = parts.whole === '' ? 1.25 : 1;
  const width = numberWidth([parts.whole, fraction].filter(Boolean).join(' '), false) * grow;
  return Math.min(most, room / (width + (parts.sign === '' ? 0 : 0.54)));
}

/** One size of one piece, in every state it can be in. Fills the box it is given; drawn for 78 px. */
export function SizeCell({ state, target, unit, cursor = false, silent = false, className }: SizeCellProps) {
  return (
    <>
      <svg
        aria-hidden="true"
        viewBox={`0 0 ${SIDE} ${SIDE}`}
        className={classNames('block size-full', className)}
      >
        <rect width={SIDE} height={SIDE} className={cursor ? 'fill-act-wash' : 'fill-plate'} />
        <CellContent {...{ state, target, unit, cursor }} />
        {cursor ? (
          <rect
            x={2.5}
            y={2.5}
            width={SIDE - 5}
            height={SIDE - 5}
            className="fill-none stroke-act [stroke-width:var(--pen-cursor)]"
          />
        ) : null}
      </svg>
      {silent ? null : <span className="sr-only">{cellInWords(state, target, unit)}</span>}
    </>
  );
}

type CellContentProps = Required<Pick<SizeCellProps, 'state' | 'target' | 'unit' | 'cursor'>>;

function CellContent({ state, target, unit, cursor }: CellContentProps) {
  switch (state.kind) {
    case 'unread': {
      const parts = lengthParts(target, unit);
      const tone = cursor ? 'fill-act font-[640]' : 'fill-ink-2 font-[440]';
      return (
        <RuleNumber parts={parts} x={MIDDLE} baseline={48} size={fitted(parts, 28, 64)} className={tone} />
      );
    }
    case 'gauged':
      return <TriedStroke />;
    case 'value':
      return <Deviation {...{ unit, deviation: state.deviation, lose: state.lose }} />;
    case 'spoiled':
      return (
        <>
          <Word y={37}>spoiled</Word>
          <path
            d="M14 56H30L35 49L43 62L48 56H64"
            className="fill-none stroke-ink [stroke-width:var(--pen-outline)]"
          />
        </>
      );
    case 'missing':
      return (
        <>
          <path d="M0 0L78 78M78 0L0 78" className="stroke-rule [stroke-width:var(--pen-inside)]" />
          <rect x={5} y={28} width={68} height={22} className="fill-plate" />
          <Word y={45}>missing</Word>
        </>
      );
    case 'conflict':
      return <TwoReadings readings={state.readings} unit={unit} />;
    default:
      return <Word y={45}>{state.kind}</Word>;
  }
}

function Word({ y, children }: { y: number; children: string }) {
  return (
    <text
      x={MIDDLE}
      y={y}
      fontSize={18}
      className="fill-ink font-[600] font-stretch-[82%] [text-anchor:middle]"
    >
      {children}
    </text>
  );
}

/** The gauged sign: one stroke, its tail run out to the cell's lower edge. */
function TriedStroke() {
  return (
    <path
      d="M14 40.5C24 36.5 38 44.5 51 41.5C61 39 66 31.5 60.5 27.5C53.5 22.5 40 29 39 46V78"
      strokeLinecap="round"
      className="fill-none stroke-ink [stroke-width:calc(var(--pen-edge)*1.15)]"
    />
  );
}

function Deviation({ unit, deviation, lose }: { unit: Unit; deviation: Length; lose?: Points }) {
  const parts = lengthParts(deviation, unit, {}, true);
  const length = Math.max(4, Math.min(1, (lose ?? 0) / POINTS_FILL_HALF) * HALF_STRIP);
  const side = sideOf(deviation);
  return (
    <>
      <RuleNumber parts={parts} x={MIDDLE} baseline={38} size={fitted(parts, 30, 68)} className="fill-ink" />
      <path d={`M9 67H69`} className="stroke-rule [stroke-width:var(--pen-inside)]" />
      {lose ? <StripBar {...{ side, lose, length }} centre={MIDDLE} top={54} height={13} /> : null}
      <path d={`M${MIDDLE} 50V70`} className="stroke-ink [stroke-width:var(--pen-outline)]" />
      {lose ? (
        <text
          x={side === 'under' ? MIDDLE + 9 : MIDDLE - 9}
          y={66}
          fontSize={17}
          paintOrder="stroke"
          strokeWidth={5}
          className={classNames(
            'tnum fill-ink stroke-plate font-[640]',
            side === 'under' ? '[text-anchor:start]' : '[text-anchor:end]',
          )}
        >
          {pointsAsText(lose)}
        </text>
      ) : null}
    </>
  );
}

function TwoReadings({ readings, unit }: { readings: readonly [CellReading, CellReading]; unit: Unit }) {
  return (
    <>
      <path d="M78 0L0 78" className="stroke-ink [stroke-width:var(--pen-outline)]" />
      <HalfReading reading={readings[0]} unit={unit} x={25} y={25} />
      <HalfReading reading={readings[1]} unit={unit} x={53} y={66} />
    </>
  );
}

function HalfReading({ reading, unit, x, y }: { reading: CellReading; unit: Unit; x: number; y: number }) {
  if (typeof reading === 'number') {
    const parts = lengthParts(reading, unit, {}, true);
    return <RuleNumber parts={parts} x={x} baseline={y} size={fitted(parts, 20, 46)} className="fill-ink" />;
  }
  return (
    <text x={x} y={y} fontSize={13} className="fill-ink font-[600] font-stretch-[76%] [text-anchor:middle]">
      {reading}
    </text>
  );
}
