import { RuleNumber } from '@/components/rule/rule-number';
import { classNames } from '@/components/ui/class-names';
import { lengthInWords } from '@/components/ui/length-in-words';
import { lengthParts } from '@/components/ui/length-parts';
import type { Length, Unit } from '@/lib/length';
import { AXES, type Axis } from '@/lib/scoring';
import { drawInstrument, howToHold, type InstrumentDrawing, instrumentFor } from './instrument';
import { type DimensionLine, layOutPart, type PartLayout } from './part-layout';

interface PartDrawingProps {
  size: Record<Axis, Length>;
  unit: Unit;
  /** The axis being measured, picked out; without it no instrument is drawn. */
  axis?: Axis | null;
  /** Whether the instrument is drawn at that axis, or the dimension only picked out. */
  withInstrument?: boolean;
  /** How far the caliper at hand opens. */
  reach?: Length;
  /** Say where to hold the instrument, with a leader to it. */
  note?: boolean;
  /** "end 2": begins what a screen reader says. */
  label?: string;
  width?: number;
  height?: number;
  /** The upper right corner that stays free. */
  corner?: { width: number; height: number };
  className?: string;
}

/** The piece in isometric: its three dimensions, the one being measured picked out, and where to hold the instrument. */
export function PartDrawing(props: PartDrawingProps) {
  const {
    size,
    unit,
    axis = null,
    withInstrument = true,
    reach,
    note = false,
    label,
    width = 500,
    height = 390,
    corner,
    className,
  } = props;
  const layout = layOutPart(size, { width, height, corner });
  const instrument = axis && withInstrument ? instrumentFor(size[axis], unit, reach) : null;
  const drawing = axis && instrument ? drawInstrument(axis, instrument, layout) : null;
  const sizes = AXES.map((each) => `${each} ${lengthInWords(size[each], unit)}`).join(', ');
  const hold = axis && instrument ? howToHold(axis, instrument) : null;
  const words = [
    label ? `${label}: ${sizes}` : sizes,
    hold ? `measure the ${axis}, ${hold.join(' ')}` : null,
  ];
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={words.filter(Boolean).join('; ')}
      className={classNames('block h-auto w-full overflow-visible', className)}
    >
      <Shapes paths={drawing?.behind ?? []} />
      <Piece layout={layout} />
      {layout.dimensions.map((dimension) => (
        <Dimension
          key={dimension.axis}
          dimension={dimension}
          ticks={size[dimension.axis]}
          unit={unit}
          measured={dimension.axis === axis}
        />
      ))}
      {drawing ? <InFront drawing={drawing} /> : null}
      {note && hold && drawing ? <Note lines={hold} grip={drawing.grip} /> : null}
    </svg>
  );
}

function Piece({ layout }: { layout: PartLayout }) {
  return (
    <g>
      <path d={layout.top + layout.side + layout.end} className="fill-plate stroke-none" />
      <path d={layout.grain} className="fill-none stroke-rule [stroke-width:var(--pen-hair)]" />
      <path
        d={layout.top + layout.side + layout.end}
        strokeLinejoin="round"
        className="fill-none stroke-ink [stroke-width:calc(var(--pen-outline)*1.3)]"
      />
    </g>
  );
}

function Shapes({ paths }: { paths: readonly string[] }) {
  return paths.map((d) => (
    <path
      key={d}
      d={d}
      strokeLinejoin="round"
      className="fill-sheet stroke-ink [stroke-width:calc(var(--pen-outline)*0.85)]"
    />
  ));
}

function InFront({ drawing }: { drawing: InstrumentDrawing }) {
  return (
    <g>
      <Shapes paths={drawing.before} />
      <path d={drawing.fine} className="fill-none stroke-ink [stroke-width:var(--pen-hair)]" />
    </g>
  );
}

interface DimensionProps {
  dimension: DimensionLine;
  ticks: Length;
  unit: Unit;
  measured: boolean;
}

const FIGURE = 26;

function Dimension({ dimension, ticks, unit, measured }: DimensionProps) {
  const size = measured ? FIGURE * 1.25 : FIGURE;
  const [x, y] = dimension.text;
  const line = measured
    ? 'stroke-act [stroke-width:calc(var(--pen-outline)*1.43)]'
    : 'stroke-ink-2 [stroke-width:var(--pen-inside)]';
  return (
    <g>
      <path
        d={dimension.extensions}
        className={classNames(
          'fill-none [stroke-width:var(--pen-inside)]',
          measured ? 'stroke-act' : 'stroke-ink-2',
        )}
      />
      <path d={dimension.line + dimension.slashes} className={`fill-none ${line}`} />
      <RuleNumber
        parts={lengthParts(ticks, unit)}
        x={x}
        baseline={y + size * 0.35}
        size={size}
        className={
          measured ? 'fill-act font-[660] font-stretch-[88%]' : 'fill-ink-2 font-[460] font-stretch-[88%]'
        }
      />
    </g>
  );
}

function Note({ lines, grip }: { lines: [string, string]; grip: readonly [number, number] }) {
  return (
    <g>
      <path d={`M62 50L${grip[0]} ${grip[1]}`} className="stroke-ink-2 [stroke-width:var(--pen-inside)]" />
      <circle cx={grip[0]} cy={grip[1]} r={3} className="fill-ink-2" />
      <g fontSize={17} className="fill-ink-2 stroke-sheet font-[460]" paintOrder="stroke" strokeWidth={5}>
        <text x={0} y={20}>
          {lines[0]}
        </text>
        <text x={0} y={42}>
          {lines[1]}
        </text>
      </g>
    </g>
  );
}
