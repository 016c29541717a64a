import { type Box, grainLines, type SpacePoint } from '@/components/part/grain';
import { type PaperPoint, pathThrough, toPaper } from '@/components/part/isometric';
import { MARK_PATH } from './mark-path';

const BOARD: Box = { length: 556, width: 58, thickness: 298 };

/** Stood on its edge: the piece's thickness direction stands up, its narrow end looks left. */
function stand([x, y, z]: SpacePoint): PaperPoint {
  return toPaper([x, y, z]);
}

function outline(...points: SpacePoint[]): string {
  return pathThrough(points.map(stand), true);
}

/** A board stood on its trued edge, with the mark on its face and the tail run out to that edge. */
export function EntranceBoard({ className }: { className?: string }) {
  const { length: l, width: w, thickness: t } = BOARD;
  const log = {
    pithY: w + 64,
    pithZ: t * 0.4,
    taper: 0.026,
    rings: Array.from({ length: 17 }, (_, k) => 84 + k * 11),
  };
  const faces = [
    { fixed: 'y', at: 0 },
    { fixed: 'x', at: 0 },
    { fixed: 'z', at: t },
  ] as const;
  const grain = faces
    .flatMap((face) => grainLines(BOARD, log, face))
    .map((line) => pathThrough(line.map(stand)));
  return (
    <svg aria-hidden="true" viewBox="-64 -612 620 650" className={className}>
      <g className="fill-plate stroke-ink [stroke-width:3]" strokeLinejoin="round">
        <path d={outline([0, 0, 0], [l, 0, 0], [l, 0, t], [0, 0, t])} />
        <path d={outline([0, 0, 0], [0, w, 0], [0, w, t], [0, 0, t])} />
        <path d={outline([0, 0, t], [l, 0, t], [l, w, t], [0, w, t])} />
      </g>
      <path d={grain.join('')} className="fill-none stroke-rule [stroke-width:0.85]" />
      <path d="M-58 33.5L546 -315.2" className="stroke-ink [stroke-width:1.5]" />
      <path d={pathThrough([stand([0, 0, 0]), stand([l, 0, 0])])} className="stroke-ink [stroke-width:9]" />
      <path d={MARK_PATH} className="fill-act" transform="matrix(2.165 -1.25 0 2.5 152 -337.8)" />
    </svg>
  );
}
