import { ScoringError } from './scoring-error';
import type { CheckList } from './worksheet';

const UNKNOWN = -1;

/** Prices what was recorded of a list of checks. `where` names the list in a refusal. */
export function markChecks(list: CheckList, recorded: Record<string, number>, where: () => string): void {
  list.levels.fill(UNKNOWN);
  for (const id of Object.keys(recorded)) recordLevel(list, id, recorded[id], where);
  list.lose = 0;
  list.unread = 0;
  list.checks.forEach((check, place) => {
    if (list.levels[place] === UNKNOWN) list.levels[place] = check.assume;
    const lose = check.loses[list.levels[place] ?? UNKNOWN];
    if (lose === undefined) list.unread += 1;
    else list.lose += lose;
  });
}

function recordLevel(list: CheckList, id: string, level: number | undefined, where: () => string): void {
  const place = list.places.get(id);
  if (place === undefined) {
    throw new ScoringError('unknown-check', `${where()}: the rubric has no check “${id}” here.`);
  }
  if (level === undefined || list.checks[place]?.loses[level] === undefined) {
    throw new ScoringError('level-out-of-range', `${where()}: check “${id}” has no level ${level}.`);
  }
  list.levels[place] = level;
}
