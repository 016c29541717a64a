import { pointsAsText } from '@/components/ui/points-text';
import { hatchPath } from './hatch';
import { rampOf } from './price-steps';
import { stairOutline, type Tread } from './stairs';

interface RuleStairProps {
  treads: readonly Tread[];
  foot: number;
  /** px a point. */
  rise: number;
  /** Size of the prices that stand on the treads; left out, none are written. */
  priceSize?: number;
  /** Tone goes this deep under a tread; below it a high step is only hatched, so that it does not weigh. */
  toneDepth?: number;
  hatchGap?: number;
  /** Where a line stands that no price may be written on. */
  avoid?: number;
}

const TONE = ['', 'fill-loss-1', 'fill-loss-2', 'fill-loss-3', 'fill-loss-4'] as const;
const ON_TONE = ['', 'rule-hatch-1', 'rule-hatch-2', 'rule-hatch-3', 'rule-hatch-4'] as const;

/** The price of error as a stair: tone, hatch, side and number all say the same. */
export function RuleStair({
  treads,
  foot,
  rise,
  priceSize,
  toneDepth = 16,
  hatchGap = 8,
  avoid,
}: RuleStairProps) {
  return (
    <g>
      {treads.map((tread) => (
        <TreadFill key={tread.left} {...{ tread, foot, rise, toneDepth, hatchGap }} />
      ))}
      <path
        d={stairOutline(treads, foot, rise)}
        className="fill-none stroke-ink [stroke-width:var(--pen-outline)]"
      />
      {priceSize
        ? treads.map((tread) => (
            <text
              key={tread.left}
              x={clearOf(avoid, (tread.left + tread.right) / 2, priceSize)}
              y={foot - (tread.lose / 100) * rise - priceSize * 0.28}
              fontSize={priceSize}
              className={`tnum [text-anchor:middle] ${tread.lose > 0 ? 'fill-ink font-[640]' : 'fill-ink-2 font-[480]'}`}
            >
              {pointsAsText(tread.lose)}
            </text>
          ))
        : null}
    </g>
  );
}

function clearOf(line: number | undefined, x: number, size: number): number {
  return line !== undefined && Math.abs(x - line) < size * 0.5 ? line + size * 0.75 : x;
}

interface TreadFillProps {
  tread: Tread;
  foot: number;
  rise: number;
  toneDepth: number;
  hatchGap: number;
}

function TreadFill({ tread, foot, rise, toneDepth, hatchGap }: TreadFillProps) {
  const ramp = rampOf(tread.lose);
  if (ramp === 0) return null;
  const height = (tread.lose / 100) * rise;
  const toned = Math.min(height, toneDepth);
  const [x, width] = [tread.left, tread.right - tread.left];
  const top = { x, width, y: foot - height, height: toned };
  const below = { x, width, y: foot - height + toned, height: height - toned };
  return (
    <g>
      <rect {...top} className={TONE[ramp]} />
      <path d={hatchPath(top, tread.side, hatchGap)} className={`rule-hatch ${ON_TONE[ramp]}`} />
      {below.height > 0.5 ? (
        <path d={hatchPath(below, tread.side, hatchGap)} className="rule-hatch rule-hatch-plain" />
      ) : null}
    </g>
  );
}
