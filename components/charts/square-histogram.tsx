import { classNames } from '@/components/ui/class-names';

interface SquareHistogramProps {
  /** Whole or not; each falls on the nearest whole number. */
  values: readonly number[];
  from: number;
  to: number;
  /** One value to pick out: whose row is open. */
  highlight?: number | null;
  /** `strip` for a table's head, `full` with its numbers. */
  kind?: 'strip' | 'full';
  /** Said first by a screen reader: "Desk caddy, 25 scores". */
  label: string;
  className?: string;
}

const SIZES = {
  strip: { width: 150, square: 4, gap: 1, numbers: false },
  full: { width: 350, square: 9, gap: 1.5, numbers: true },
};

/** How many values fall on each whole number; what lies outside is counted at the nearer end. */
export function countByWhole(values: readonly number[], from: number, to: number): Map<number, number> {
  const counts = new Map<number, number>();
  for (const value of values) {
    const at = Math.min(to, Math.max(from, Math.round(value)));
    counts.set(at, (counts.get(at) ?? 0) + 1);
  }
  return counts;
}

/** Every score one square, stacked on a rule: who stands where, with nobody averaged away. */
export function SquareHistogram(props: SquareHistogramProps) {
  const { values, from, to, highlight = null, kind = 'strip', label } = props;
  const { width, square, gap, numbers } = SIZES[kind];
  const counts = countByWhole(values, from, to);
  const tallest = Math.max(1, ...counts.values());
  const step = square + gap;
  const edge = Math.max(tallest, 5) * step + 3;
  const height = edge + (numbers ? 30 : 9);
  const place = (value: number) => 8 + ((value - from) / Math.max(1, to - from)) * (width - 16);
  const marks = Array.from({ length: to - from + 1 }, (_, index) => from + index).filter(
    (mark) => mark % 5 === 0,
  );
  const marked = highlight === null ? null : Math.min(to, Math.max(from, Math.round(highlight)));
  return (
    <svg
      viewBox={`0 0 ${width} ${height}`}
      role="img"
      aria-label={`${label}: ${values.length === 0 ? 'none yet' : `from ${Math.min(...values)} to ${Math.max(...values)}`}`}
      className={classNames(
        'block h-auto',
        kind === 'strip' ? 'w-[150px]' : 'w-full max-w-[28rem]',
        props.className,
      )}
    >
      {[...counts].flatMap(([value, count]) =>
        Array.from({ length: count }, (_, nth) => (
          <rect
            key={`${value}-${nth.toString()}`}
            x={place(value) - square / 2}
            y={edge - 2 - (nth + 1) * step + gap}
            width={square}
            height={square}
            className={value === marked && nth === 0 ? 'fill-act' : 'fill-ink'}
          />
        )),
      )}
      <path d={`M0 ${edge}H${width}`} className="stroke-ink [stroke-width:var(--pen-outline)]" />
      {marks.map((mark) => (
        <g key={mark}>
          <path
            d={`M${place(mark)} ${edge}v${mark % 10 === 0 ? 8 : 5}`}
            className="stroke-ink [stroke-width:var(--pen-inside)]"
          />
          {numbers && mark % 10 === 0 ? (
            <text x={place(mark)} y={edge + 26} fontSize={16} className="tnum fill-ink [text-anchor:middle]">
              {mark < 0 ? `−${-mark}` : mark}
            </text>
          ) : null}
        </g>
      ))}
    </svg>
  );
}
