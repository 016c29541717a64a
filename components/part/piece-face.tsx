import type { Length } from '@/lib/length';
import { TICKS_PER_INCH } from '@/lib/length';
import type { Axis } from '@/lib/scoring';

export type PieceFaceState = 'present' | 'cursor' | 'spoiled' | 'missing' | 'held';

interface PieceFaceProps {
  size: Record<Axis, Length>;
  /** px a tick: one scale for all pieces that stand together, from `pieceScale`. */
  scale: number;
  state?: PieceFaceState;
  className?: string;
}

const LARGEST_SCALE = 12 / TICKS_PER_INCH;
const SLIMMEST = 9;

/** One scale for pieces that stand in a row: 12 px an inch, less if the tallest or the widest would not fit. */
export function pieceScale(
  sizes: readonly Record<Axis, Length>[],
  room: { height: number; columnWidth: number },
): number {
  const tallest = Math.max(1, ...sizes.map((size) => size.length));
  const widest = Math.max(1, ...sizes.map((size) => size.width));
  return Math.min(LARGEST_SCALE, room.height / tallest, room.columnWidth / widest);
}

function grain(width: number, height: number): string {
  const count = Math.max(2, Math.round(width / 11));
  return Array.from({ length: count }, (_, index) => {
    const x = (width * (index + 0.5)) / count;
    const sway = index % 2 === 0 ? 2 : -2.4;
    return `M${x} 4C${x + sway} ${height * 0.3} ${x - sway} ${height * 0.6} ${x + sway * 0.5} ${height - 4}`;
  }).join('');
}

/** A piece seen from the front, standing on its end: width across, length up. Its name is the caller's to write. */
export function PieceFace({ size, scale, state = 'present', className }: PieceFaceProps) {
  const width = Math.max(SLIMMEST, size.width * scale);
  const height = Math.max(SLIMMEST, size.length * scale);
  const pen = state === 'cursor' ? 3 : 1.75;
  const gone = state === 'missing';
  const middle = width / 2;
  return (
    <svg
      aria-hidden="true"
      width={width + 4}
      height={height + 2}
      viewBox={`-2 -2 ${width + 4} ${height + 2}`}
      className={className}
    >
      <rect
        width={width}
        height={height}
        strokeDasharray={gone ? '4 3' : undefined}
        strokeWidth={pen}
        className={
          gone
            ? 'fill-none stroke-rule'
            : state === 'cursor'
              ? 'fill-act-wash stroke-act'
              : 'fill-plate stroke-ink'
        }
      />
      {gone ? null : (
        <path
          d={grain(width, height)}
          className={`fill-none [stroke-width:var(--pen-hair)] ${state === 'cursor' ? 'stroke-act opacity-60' : 'stroke-rule'}`}
        />
      )}
      {state === 'spoiled' ? (
        <path
          d={`M${middle} 0V${height * 0.42}L${middle - 5} ${height * 0.5}L${middle + 5} ${height * 0.62}L${middle - 4} ${height * 0.74}L${middle} ${height * 0.82}V${height}`}
          className="fill-none stroke-ink [stroke-width:var(--pen-outline)]"
        />
      ) : null}
      {state === 'held' ? (
        <path d={`M-2 ${height * 0.45}H${width + 2}`} className="stroke-ink [stroke-width:var(--pen-edge)]" />
      ) : null}
    </svg>
  );
}
