import { hatchPath } from '@/components/rule/hatch';
import { classNames } from '@/components/ui/class-names';
import type { MoveStroke } from './move-layout';

interface StrokeProps {
  stroke: MoveStroke;
  thickness: number;
  held: boolean;
}

/** A knife line where the score was, a bar to where it will be, and its point: full for a gain, hatched for a drop. */
export function Stroke({ stroke, thickness, held }: StrokeProps) {
  const { side, y, from, to, figure, name } = stroke;
  const drop = side === 'drop';
  const length = Math.abs(to - from);
  const point = Math.min(length, thickness);
  const neck = drop ? to + point : to - point;
  const bar = { x: Math.min(from, neck), y: y - thickness / 2, width: length - point, height: thickness };
  const outline = classNames(
    'stroke-ink [stroke-width:var(--pen-inside)]',
    drop ? 'fill-plate' : 'fill-ink',
    held && '[stroke-dasharray:3_2.5]',
  );
  return (
    <g>
      {bar.width > 0 ? <rect {...bar} className={outline} /> : null}
      {bar.width > 0 && drop && !held ? (
        <path d={hatchPath(bar, 'under', 4.6)} className="rule-hatch rule-hatch-1" />
      ) : null}
      <path
        d={`M${to} ${y}L${neck} ${y - thickness * 0.85}V${y + thickness * 0.85}Z`}
        className={held ? outline : 'fill-ink stroke-ink [stroke-width:var(--pen-inside)]'}
      />
      <path
        d={`M${from} ${y - thickness * 0.85}V${y + thickness * 0.85}`}
        className={classNames(
          'stroke-ink',
          held ? '[stroke-width:var(--pen-edge)]' : '[stroke-width:var(--pen-outline)]',
        )}
      />
      {name ? (
        <>
          <Words at={figure} y={y} className={held ? 'fill-ink-2' : 'fill-ink font-[660]'} />
          <Words at={name} y={y} className="fill-ink" />
        </>
      ) : null}
    </g>
  );
}

function Words({ at, y, className }: { at: MoveStroke['figure']; y: number; className: string }) {
  return (
    <text
      x={at.x}
      y={y + 4.5}
      fontSize={13.5}
      className={classNames(
        'tnum',
        at.anchor === 'end' ? '[text-anchor:end]' : '[text-anchor:start]',
        className,
      )}
    >
      {at.text}
    </text>
  );
}
