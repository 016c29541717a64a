import { pointsAsText } from '@/components/ui/points-text';
import type { Points } from '@/lib/scoring';
import { hatchPath } from './hatch';
import { rampOf, type Side } from './price-steps';

const TONE = ['', 'fill-loss-1', 'fill-loss-2', 'fill-loss-3', 'fill-loss-4'] as const;

interface StripBarProps {
  side: Side;
  lose: Points;
  /** The tone's price, where it is not the length's: the dearest single size of a sum. */
  toneOf?: Points;
  centre: number;
  top: number;
  height: number;
  length: number;
}

/** One bar from the knife line: left for under, right for over. */
export function StripBar({ side, lose, toneOf = lose, centre, top, height, length }: StripBarProps) {
  const ramp = rampOf(toneOf);
  if (lose <= 0 || ramp === 0) return null;
  const patch = { x: side === 'under' ? centre - length : centre, y: top, width: length, height };
  return (
    <g>
      <rect {...patch} className={`${TONE[ramp]} stroke-ink [stroke-width:var(--pen-inside)]`} />
      <path d={hatchPath(patch, side, 4.6)} className={`rule-hatch rule-hatch-${ramp}`} />
    </g>
  );
}

interface DeviationStripProps {
  /** Points lost under and over. */
  under: Points;
  over: Points;
  /** The points that fill half the strip; more is cut off there. */
  full: Points;
  /** The dearest single size on each side, where the strip sums several: it sets the tone. */
  dearestUnder?: Points;
  dearestOver?: Points;
  kind?: 'row' | 'wide';
  /** Said before the points: "length". */
  label?: string;
  className?: string;
}

const SIZES = {
  row: { width: 72, height: 18, bar: 12 },
  wide: { width: 240, height: 22, bar: 16 },
};

/** Where points went: a knife line, a bar left for under and right for over, its length the points. */
export function DeviationStrip(props: DeviationStripProps) {
  const { under, over, full, dearestUnder, dearestOver, kind = 'row', label } = props;
  const { width, height, bar } = SIZES[kind];
  const centre = width / 2;
  const top = (height - bar) / 2;
  const lengthOf = (points: Points) =>
    full <= 0 ? 0 : Math.max(3, Math.min(1, points / full) * (centre - 2));
  const words = `${label ? `${label}: ` : ''}loses ${pointsAsText(under)} under, ${pointsAsText(over)} over`;
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={words}
      width={width}
      height={height}
      className={`block max-w-full ${props.className ?? ''}`}
    >
      <StripBar
        side="under"
        lose={under}
        toneOf={dearestUnder}
        length={lengthOf(under)}
        {...{ centre, top }}
        height={bar}
      />
      <StripBar
        side="over"
        lose={over}
        toneOf={dearestOver}
        length={lengthOf(over)}
        {...{ centre, top }}
        height={bar}
      />
      <path d={`M${centre} 0V${height}`} className="stroke-ink [stroke-width:var(--pen-outline)]" />
    </svg>
  );
}
