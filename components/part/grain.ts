/** A point of the piece: x along the grain, y across it, z through the thickness; any unit of length. */
export type SpacePoint = readonly [x: number, y: number, z: number];

export interface Box {
  length: number;
  width: number;
  thickness: number;
}

/** The tree the piece came from: where its pith runs, how far its rings are apart, how fast they draw in. */
export interface Log {
  pithY: number;
  pithZ: number;
  rings: readonly number[];
  taper: number;
}

/** A face of the box, by the coordinate that stands still on it. */
export interface SeenFace {
  fixed: 'x' | 'y' | 'z';
  at: number;
}

const STEPS = 72;

/** A log that gives the piece a handful of growth lines on each face, whatever its proportions. */
export function logFor(box: Box, ringCount = 10): Log {
  const across = Math.max(box.width, box.thickness);
  const pithY = box.width * 0.44;
  const pithZ = -Math.max(across * 0.16, box.thickness * 0.5);
  const taper = box.length / (across * 1.05) ** 2;
  const near = -pithZ * 0.92;
  const far = Math.hypot(box.width - pithY, box.thickness - pithZ, Math.sqrt(box.length / taper));
  const rings = Array.from({ length: ringCount }, (_, k) => near + ((far - near) * (k + 0.55)) / ringCount);
  return { pithY, pithZ, rings, taper };
}

/** A slow waver of a ring about its pith; none at the pith itself, where it would turn into a knot. */
function wavering(log: Log, ring: number, y: number, z: number): number {
  const out = Math.min(1, Math.hypot(y - log.pithY, z - log.pithZ) / ring);
  const angle = Math.atan2(z - log.pithZ, y - log.pithY);
  const seed = 40 * (ring / (log.rings.at(-1) ?? ring));
  return 1 + out * out * (0.022 * Math.sin(2 * angle + seed) + 0.011 * Math.sin(5 * angle - 1.7 * seed));
}

/** How far along the piece a ring has drawn in to a point of the cross-section; beyond 0…length it is cut off. */
function reachAlong(log: Log, ring: number, y: number, z: number): number {
  const radius = ring * wavering(log, ring, y, z);
  return log.taper * (radius ** 2 - (y - log.pithY) ** 2 - (z - log.pithZ) ** 2);
}

function ringOnEnd(log: Log, ring: number, at: number): SpacePoint[] {
  const steps = 4 * STEPS;
  return Array.from({ length: steps + 1 }, (_, step) => {
    const angle = (2 * Math.PI * step) / steps;
    const [cos, sin] = [Math.cos(angle), Math.sin(angle)];
    const radius = ring * wavering(log, ring, log.pithY + ring * cos, log.pithZ + ring * sin);
    return [at, log.pithY + radius * cos, log.pithZ + radius * sin];
  });
}

function ringOnSide(log: Log, ring: number, box: Box, face: SeenFace): SpacePoint[] {
  const span = face.fixed === 'z' ? box.width : box.thickness;
  return Array.from({ length: STEPS + 1 }, (_, step) => {
    const along = (span * step) / STEPS;
    const [y, z] = face.fixed === 'z' ? [along, face.at] : [face.at, along];
    return [reachAlong(log, ring, y, z), y, z];
  });
}

function inside([x, y, z]: SpacePoint, box: Box): boolean {
  const slack = 1e-9;
  return (
    x >= -slack &&
    x <= box.length + slack &&
    y >= -slack &&
    y <= box.width + slack &&
    z >= -slack &&
    z <= box.thickness + slack
  );
}

/** The point where a step leaves the box, found by halving. */
function crossing(within: SpacePoint, without: SpacePoint, box: Box): SpacePoint {
  let [a, b] = [within, without];
  for (let turn = 0; turn < 20; turn++) {
    const middle: SpacePoint = [(a[0] + b[0]) / 2, (a[1] + b[1]) / 2, (a[2] + b[2]) / 2];
    if (inside(middle, box)) a = middle;
    else b = middle;
  }
  return a;
}

function clip(line: SpacePoint[], box: Box): SpacePoint[][] {
  const runs: SpacePoint[][] = [];
  let run: SpacePoint[] = [];
  line.forEach((point, index) => {
    const before = line[index - 1];
    const now = inside(point, box);
    if (before && inside(before, box) !== now) {
      run.push(now ? crossing(point, before, box) : crossing(before, point, box));
    }
    if (now) run.push(point);
    else if (run.length > 0) {
      runs.push(run);
      run = [];
    }
  });
  if (run.length > 0) runs.push(run);
  return runs.filter((each) => each.length > 1);
}

/**
 * The growth lines of one face. All faces are cut from the same log, so that a parabola on the face
 * ends where an arc of the end grain begins.
 */
export function grainLines(box: Box, log: Log, face: SeenFace): SpacePoint[][] {
  return log.rings.flatMap((ring) =>
    clip(face.fixed === 'x' ? ringOnEnd(log, ring, face.at) : ringOnSide(log, ring, box, face), box),
  );
}
