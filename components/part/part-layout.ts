import type { Axis } from '@/lib/scoring';
import { type Box, grainLines, logFor, type SpacePoint } from './grain';
import { type PaperPoint, pathThrough, toPaper } from './isometric';

/** The paper a part is drawn on; its upper right corner may be kept free, for the target at the bench. */
export interface PartFrame {
  width: number;
  height: number;
  corner?: { width: number; height: number };
}

export interface DimensionLine {
  axis: Axis;
  /** The line itself, its two extension lines, its two slashes. */
  line: string;
  extensions: string;
  slashes: string;
  text: PaperPoint;
}

export interface PartLayout {
  box: Box;
  /** px of paper a unit of the piece. */
  scale: number;
  place: (point: SpacePoint) => PaperPoint;
  top: string;
  side: string;
  end: string;
  grain: string;
  dimensions: DimensionLine[];
}

/** Nothing is drawn thinner than this part of the longest side, so that every face can be seen. */
const THINNEST = 0.1;
const INSET = { left: 62, right: 84, top: 92, foot: 44 };
const OFFSET = 24;
const SLASH = 8;

/** The piece as drawn: true in its proportions, except that very thin sides are thickened. */
export function drawnBox(size: Record<Axis, number>): Box {
  const least = Math.max(size.thickness, size.width, size.length) * THINNEST;
  return {
    thickness: Math.max(size.thickness, least),
    width: Math.max(size.width, least),
    length: Math.max(size.length, least),
  };
}

function cornersOf(box: Box): SpacePoint[] {
  return [0, box.length].flatMap((x) =>
    [0, box.width].flatMap((y) => [0, box.thickness].map((z): SpacePoint => [x, y, z])),
  );
}

/** How far the instrument and the figures reach past the piece's own corners, in px of paper. */
const TAIL = 46;
const FIGURE_OUT = 84;
const SHRINK = 0.96;

/** What comes nearest to the upper right: the piece's edge, its thickness figure, an instrument in any plane. */
function upperRight({ length: l, width: w, thickness: t }: Box, scale: number): PaperPoint[] {
  const edge = [0, 0.2, 0.4, 0.6, 0.8, 1].map((share) => toPaper([l, w * share, t], scale));
  const [tipX, tipY] = toPaper([l, w / 2, t], scale);
  const beam = [0, 0.5, 1].map(
    (share): PaperPoint => [tipX + TAIL * 0.866 * share, tipY - TAIL * 0.5 * share - 18],
  );
  const [uprightX, uprightY] = toPaper([l * 0.8, 0, t], scale);
  const [figureX, figureY] = toPaper([l, 0, t], scale);
  return [...edge, ...beam, [uprightX + 20, uprightY - TAIL + 12], [figureX + FIGURE_OUT, figureY - 40]];
}

function origin(box: Box, frame: PartFrame, scale: number): PaperPoint {
  const points = cornersOf(box).map((corner) => toPaper(corner, scale));
  const [xs, ys] = [points.map(([x]) => x), points.map(([, y]) => y)];
  const [left, right, top, foot] = [Math.min(...xs), Math.max(...xs), Math.min(...ys), Math.max(...ys)];
  const spareX = frame.width - INSET.left - INSET.right - (right - left);
  const spareY = frame.height - INSET.top - INSET.foot - (foot - top);
  if (frame.corner) return [INSET.left - left, INSET.top - top + spareY];
  return [INSET.left - left + spareX / 2, INSET.top - top + spareY / 2];
}

function clearOfCorner(box: Box, frame: PartFrame, scale: number): boolean {
  const { corner } = frame;
  if (!corner) return true;
  const [x0, y0] = origin(box, frame, scale);
  return upperRight(box, scale).every(
    ([x, y]) => x0 + x <= frame.width - corner.width || y0 + y >= corner.height,
  );
}

/** As large as the room for dimensions and the free corner allow. */
function placeInFrame(box: Box, frame: PartFrame) {
  const { length: l, width: w, thickness: t } = box;
  const [wide, high] = [(l + w) * (Math.sqrt(3) / 2), (l + w) / 2 + t];
  const roomX = frame.width - INSET.left - INSET.right;
  const roomY = frame.height - INSET.top - INSET.foot;
  const largest = Math.min(roomX / wide, roomY / high);
  let scale = largest;
  while (!clearOfCorner(box, frame, scale) && scale > largest / 4) scale *= SHRINK;
  const [x0, y0] = origin(box, frame, scale);
  const place = (point: SpacePoint): PaperPoint => {
    const [x, y] = toPaper(point, scale);
    return [x0 + x, y0 + y];
  };
  return { scale, place };
}

interface DimensionPlan {
  axis: Axis;
  from: SpacePoint;
  to: SpacePoint;
  /** The way out from the piece, in units of the piece. */
  out: SpacePoint;
  slash: PaperPoint;
  textOut: number;
}

function shifted([x, y, z]: SpacePoint, [a, b, c]: SpacePoint, by: number): SpacePoint {
  return [x + a * by, y + b * by, z + c * by];
}

function dimensionLine(plan: DimensionPlan, place: PartLayout['place'], scale: number): DimensionLine {
  const { axis, from, to, out, slash, textOut } = plan;
  const at = (point: SpacePoint, px: number) => place(shifted(point, out, px / scale));
  const [start, end] = [at(from, OFFSET), at(to, OFFSET)];
  const slashAt = ([x, y]: PaperPoint) =>
    pathThrough([
      [x - slash[0], y - slash[1]],
      [x + slash[0], y + slash[1]],
    ]);
  const [a, b] = [at(from, textOut), at(to, textOut)];
  return {
    axis,
    line: pathThrough([start, end]),
    extensions:
      pathThrough([at(from, 5), at(from, OFFSET + 8)]) + pathThrough([at(to, 5), at(to, OFFSET + 8)]),
    slashes: slashAt(start) + slashAt(end),
    text: [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2],
  };
}

/** Lays out an isometric of the piece with its growth lines and three dimension lines. */
export function layOutPart(size: Record<Axis, number>, frame: PartFrame): PartLayout {
  const box = drawnBox(size);
  const { length: l, width: w, thickness: t } = box;
  const { scale, place } = placeInFrame(box, frame);
  const outline = (...corners: SpacePoint[]) => pathThrough(corners.map(place), true);
  const log = logFor(box);
  const grain = [
    { fixed: 'z', at: t } as const,
    { fixed: 'y', at: 0 } as const,
    { fixed: 'x', at: 0 } as const,
  ].flatMap((face) => grainLines(box, log, face));
  const plans: DimensionPlan[] = [
    {
      axis: 'width',
      from: [0, 0, 0],
      to: [0, w, 0],
      out: [-1, 0, 0],
      slash: [SLASH * 0.5, -SLASH],
      textOut: 58,
    },
    {
      axis: 'length',
      from: [0, 0, 0],
      to: [l, 0, 0],
      out: [0, -1, 0],
      slash: [SLASH * 0.5, SLASH],
      textOut: 58,
    },
    {
      axis: 'thickness',
      from: [l, 0, 0],
      to: [l, 0, t],
      out: [1, 0, 0],
      slash: [SLASH, -SLASH * 0.9],
      textOut: 56,
    },
  ];
  return {
    box,
    scale,
    place,
    top: outline([0, 0, t], [l, 0, t], [l, w, t], [0, w, t]),
    side: outline([0, 0, 0], [l, 0, 0], [l, 0, t], [0, 0, t]),
    end: outline([0, 0, 0], [0, w, 0], [0, w, t], [0, 0, t]),
    grain: grain.map((line) => pathThrough(line.map(place))).join(''),
    dimensions: plans.map((plan) => dimensionLine(plan, place, scale)),
  };
}
