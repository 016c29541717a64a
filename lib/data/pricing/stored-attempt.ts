import { type Attempt, AXES, attemptSchema, type Piece } from '@/lib/scoring';

/**
 * An attempt out of our own tables. It may hold pieces of several versions of a practical, more than one rubric can
 * have. Checked by hand, for thousands are read at once; what does not pass is put to the schema, which says why.
 */
export function storedAttempt(stored: unknown): Attempt {
  return isAttempt(stored) ? stored : attemptSchema.parse(stored);
}

function isAttempt(value: unknown): value is Attempt {
  return (
    isObject(value) &&
    Array.isArray(value.pieces) &&
    value.pieces.every(isPiece) &&
    isLevels(value.work) &&
    isCount(value.bonus) &&
    isCount(value.daysLate) &&
    value.adjust === undefined
  );
}

const STATES: ReadonlySet<unknown> = new Set<Piece['state']>(['present', 'missing', 'held', 'excused']);
const WITHOUT_NUMBER: ReadonlySet<unknown> = new Set(['gauged', 'spoiled', 'excused']);

function isPiece(value: unknown): value is Piece {
  if (!isObject(value) || !isObject(value.sizes)) return false;
  const { lineId, ordinal, state, sizes } = value;
  if (typeof lineId !== 'string' || !isCount(ordinal) || ordinal === 0 || !STATES.has(state)) return false;
  for (const axis of AXES) {
    const size = sizes[axis];
    if (size !== undefined && !isReading(size)) return false;
  }
  return isLevels(value.checks);
}

function isReading(value: unknown): boolean {
  if (!isObject(value)) return false;
  if (value.kind === 'value') return isCount(value.ticks) && value.ticks > 0;
  return WITHOUT_NUMBER.has(value.kind);
}

function isLevels(value: unknown): value is Record<string, number> {
  if (!isObject(value)) return false;
  for (const id in value) if (!isCount(value[id])) return false;
  return true;
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}

function isCount(value: unknown): value is number {
  return typeof value === 'number' && Number.isSafeInteger(value) && value >= 0;
}
