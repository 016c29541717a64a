import { classNames } from '@/components/ui/class-names';
import type { Points } from '@/lib/scoring';
import { layOutMoves, type MoveGroup, type MoveLayout, type Mover } from './move-layout';
import type { MoveMark } from './move-scale';
import { Stroke } from './move-stroke';

interface MoveDrawingProps {
  movers: readonly Mover[];
  total: Points;
  /** Who would drop keeps what was: the stroke is drawn open, as what does not happen. */
  held: boolean;
  /** Said by a screen reader; the table has the rest. */
  label: string;
}

/** Who moves: a stroke each from before to after on one rule, gains to the right, drops to the left. */
export function MoveDrawing(props: MoveDrawingProps) {
  return (
    <>
      <Drawing {...props} width={580} className="max-md:hidden" />
      <Drawing {...props} width={358} className="md:hidden" />
    </>
  );
}

function Drawing({
  movers,
  total,
  held,
  label,
  width,
  className,
}: MoveDrawingProps & { width: number; className: string }) {
  const layout = layOutMoves(movers, total, width);
  return (
    <svg
      viewBox={`0 0 ${width} ${layout.height}`}
      role="img"
      aria-label={label}
      className={classNames('block h-auto w-full', className)}
    >
      <Guides layout={layout} />
      <Rule layout={layout} />
      {layout.groups.map((group) => (
        <text key={group.words} x={1} y={group.y} fontSize={15} className="fill-ink font-[660]">
          {groupWords(group, held)}
        </text>
      ))}
      {layout.strokes.map((stroke) => (
        <Stroke
          key={stroke.key}
          stroke={stroke}
          thickness={layout.thickness}
          held={held && stroke.side === 'drop'}
        />
      ))}
      {layout.squares.map(({ key, x, y }) => (
        <rect key={key} x={x} y={y} width={layout.square} height={layout.square} className="fill-ink" />
      ))}
      <path d={`M0 ${layout.base}H${width}`} className="stroke-ink [stroke-width:var(--pen-outline)]" />
    </svg>
  );
}

function groupWords({ words, count, lower }: MoveGroup, held: boolean): string {
  if (words === 'gain') return `${count} ${count === 1 ? 'gains' : 'gain'} +`;
  if (words === 'drop') return held ? `${count} held` : `${count} ${count === 1 ? 'drops' : 'drop'} −`;
  const further = lower > 0 ? `, ${lower} of them lower than this rule` : '';
  return `${count} ${count === 1 ? 'stays' : 'stay'}${further}`;
}

/** Lines down from every numbered mark, so that a stroke far below can be read off. */
function Guides({ layout: { marks, edge, base } }: { layout: MoveLayout }) {
  return marks
    .filter(({ numbered }) => numbered)
    .map(({ value, x }) => (
      <path
        key={value}
        d={`M${x} ${edge}V${base}`}
        className="stroke-hair [stroke-width:var(--pen-inside)]"
      />
    ));
}

function Rule({ layout: { marks, edge, width } }: { layout: MoveLayout }) {
  return (
    <>
      <rect
        x={1}
        y={1}
        width={width - 2}
        height={edge - 1}
        className="fill-plate stroke-ink [stroke-width:var(--pen-outline)]"
      />
      <path d={`M0 ${edge}H${width}`} className="stroke-ink [stroke-width:var(--pen-edge)]" />
      {marks.map((mark) => (
        <Mark key={mark.value} mark={mark} edge={edge} width={width} />
      ))}
    </>
  );
}

const RISE = { long: 20, middle: 15, short: 8 };

function Mark({
  mark: { value, x, size, numbered },
  edge,
  width,
}: {
  mark: MoveMark;
  edge: number;
  width: number;
}) {
  const half = String(value).length * 5;
  return (
    <>
      <path
        d={`M${x} ${edge}v${-RISE[size]}`}
        className={classNames(
          'stroke-ink',
          size === 'short' ? '[stroke-width:var(--pen-inside)]' : '[stroke-width:var(--pen-outline)]',
        )}
      />
      {numbered ? (
        <text
          x={Math.min(width - half - 3, Math.max(half + 3, x))}
          y={17}
          fontSize={16}
          className={classNames('tnum fill-ink [text-anchor:middle]', size === 'long' ? 'font-[660]' : '')}
        >
          {value}
        </text>
      ) : null}
    </>
  );
}
