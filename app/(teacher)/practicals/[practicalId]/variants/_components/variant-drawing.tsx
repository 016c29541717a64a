import { classNames } from '@/components/ui/class-names';
import type { Axis } from '@/lib/scoring';
import type { CutList } from '@/lib/scoring/rubric-form';

interface VariantDrawingProps {
  original: CutList;
  variant: CutList;
  width: number;
  height: number;
  className?: string;
}

const GAP = 14;
const PEN = 1.75;

/** px a tick, for every list of one family alike, so that they can be compared by eye. */
function scaleFor({ lines }: CutList, width: number, height: number): number {
  const across = lines.reduce((sum, { target }) => sum + target.width * 1.25, 0);
  const tallest = Math.max(...lines.map(({ target }) => target.length * 1.25));
  return Math.min((height - PEN * 2) / tallest, (width - GAP * lines.length) / across);
}

/** One piece of each line standing on its end; the original behind it, dashed, where they differ. */
export function VariantDrawing({ original, variant, width, height, className }: VariantDrawingProps) {
  const scale = scaleFor(original, width, height);
  let x = PEN;
  const pieces = original.lines.map(({ id, target }, index) => {
    const own = variant.lines[index]?.target ?? target;
    const at = x;
    x += Math.max(target.width, own.width) * scale + GAP;
    return { id, at, was: target, own };
  });
  return (
    <svg
      aria-hidden="true"
      viewBox={`0 0 ${width} ${height}`}
      width={width}
      height={height}
      className={classNames('max-w-full', className)}
    >
      {pieces.map(({ id, at, was, own }) => (
        <g key={id}>
          <PieceRect x={at} foot={height - PEN} size={own} scale={scale} className="fill-plate stroke-ink" />
          {differs(was, own) ? (
            <PieceRect
              x={at}
              foot={height - PEN}
              size={was}
              scale={scale}
              dashed
              className="fill-none stroke-act"
            />
          ) : null}
        </g>
      ))}
      <path d={`M0 ${height - PEN / 2}H${Math.min(width, x)}`} className="stroke-ink" strokeWidth={PEN} />
    </svg>
  );
}

type Size = Record<Axis, number>;

const differs = (a: Size, b: Size) => a.width !== b.width || a.length !== b.length;

interface PieceRectProps {
  x: number;
  foot: number;
  size: Size;
  scale: number;
  dashed?: boolean;
  className: string;
}

function PieceRect({ x, foot, size, scale, dashed = false, className }: PieceRectProps) {
  const [width, height] = [size.width * scale, size.length * scale];
  return (
    <rect
      x={x}
      y={foot - height}
      width={width}
      height={height}
      strokeWidth={dashed ? 1.25 : PEN}
      strokeDasharray={dashed ? '5 3' : undefined}
      className={className}
    />
  );
}
