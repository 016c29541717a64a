import { ScoringError } from './scoring-error';
import type { Piece, Points } from './types';
import type { PricedCheck, PricedChecks } from './worksheet';

/** What a list of checks came to; overwritten by every call. */
export interface CheckTally {
  uncapped: Points;
  unread: number;
}

/** `piece` is null where the work checks are meant. */
function refuse(code: ScoringError['code'], piece: Piece | null, text: string): never {
  const where = piece === null ? 'Work' : `Piece ${piece.ordinal} of “${piece.lineId}”`;
  throw new ScoringError(code, `${where}: ${text}`);
}

/** Checks are mostly recorded in the rubric's order, so the one after the last is tried first. */
function findCheck(checks: PricedChecks, id: string, guess: number): PricedCheck | undefined {
  const next = checks.list[guess];
  return next?.id === id ? next : checks.byId.get(id);
}

/** Adds up a list of checks: recorded levels take the place of assumed ones, unknown ones are refused. */
export function markChecks(
  checks: PricedChecks,
  recorded: Record<string, number>,
  piece: Piece | null,
  tally: CheckTally,
): void {
  let { lose, unread } = checks;
  let guess = 0;
  for (const id of Object.keys(recorded)) {
    const check = findCheck(checks, id, guess);
    if (check === undefined) refuse('unknown-check', piece, `the rubric has no check “${id}” here.`);
    const level = recorded[id];
    const price = level === undefined ? undefined : check.loses[level];
    if (price === undefined) refuse('level-out-of-range', piece, `check “${id}” has no level ${level}.`);
    lose += price - (check.assumed ?? 0);
    if (check.assumed === null) unread -= 1;
    guess += 1;
  }
  tally.uncapped = lose;
  tally.unread = unread;
}
