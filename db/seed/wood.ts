import { type Length, TICKS_PER_INCH, TICKS_PER_MM } from '@/lib/length';
import { AXES, type Axis, type Line, type Rubric } from '@/lib/scoring';
import type { RoomPlan } from './plan';
import type { Random } from './random';

/** How one student works: what the room does to everybody, and what this hand adds. */
export interface Hand {
  room: RoomPlan;
  skill: number;
  /** Forgot the kerf between parts: every length comes out short by half of it. */
  forgetsKerf: boolean;
  /** Lost one piece. */
  losesPiece: boolean;
}

export interface MadePiece {
  line: Line;
  ordinal: number;
  present: boolean;
  sizes: Record<Axis, Length>;
  checks: Record<string, number>;
}

export function makeHand(random: Random, room: RoomPlan): Hand {
  return {
    room,
    skill: room.skill * (0.6 + random.next() * 0.9),
    forgetsKerf: random.chance(0.17),
    losesPiece: random.chance(0.04),
  };
}

/** One step of error in this rubric: its first priced band, seldom under 1/64 in or 0.5 mm. */
export function stepOf(rubric: Rubric): Length {
  return rubric.unit === 'in' ? TICKS_PER_INCH / 32 : TICKS_PER_MM / 2;
}

const SPREAD: Record<Axis, number> = { thickness: 0.35, width: 0.6, length: 0.75 };

/** The pieces a student made, as they really are. */
export function makePieces(random: Random, rubric: Rubric, hand: Hand): MadePiece[] {
  const step = stepOf(rubric);
  const tight = rubric.lines.every((line) => (line.sizes.length.over[0]?.within ?? step) < step);
  const care = tight ? 0.55 : 1;
  const pieces = rubric.lines.flatMap((line) =>
    Array.from({ length: line.quantity }, (_, index) => makePiece(random, line, index + 1, step, hand, care)),
  );
  const lost = hand.losesPiece ? random.whole(0, pieces.length - 1) : -1;
  return pieces.map((piece, index) => ({ ...piece, present: index !== lost }));
}

function makePiece(
  random: Random,
  line: Line,
  ordinal: number,
  step: Length,
  hand: Hand,
  care: number,
): MadePiece {
  const sizes = { ...line.target };
  for (const axis of AXES) {
    const scatter = random.normal() * SPREAD[axis] * hand.skill * care;
    const shift = (axis === 'width' ? hand.room.fence : 0) - (axis === 'length' && hand.forgetsKerf ? 2 : 0);
    sizes[axis] = Math.max(step, line.target[axis] + Math.round((scatter + shift) * step));
  }
  const checks: Record<string, number> = {};
  for (const check of line.checks) {
    if (random.chance(0.05 * hand.skill)) checks[check.id] = check.levels.length - 1;
  }
  return { line, ordinal, present: true, sizes, checks };
}

/** What an instrument says of a true size: the nearest graduation. */
export function readSize(size: Length, graduation: Length): Length {
  return Math.max(graduation, Math.round(size / graduation) * graduation);
}
