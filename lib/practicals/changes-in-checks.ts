import type { Check } from '@/lib/scoring';
import { pointsAsTyped } from './as-typed';
import { nowWas, quoted } from './change-words';
import { joinWords, type MatchedLine } from './compare-sizes';
import type { Phrase } from './compare-types';

/** Changes in the checks of pieces; lines on which the same changes are told together. */
export function changesInPieceChecks(lines: readonly MatchedLine[]): Phrase[] {
  const groups = new Map<string, { was: Check[]; now: Check[]; labels: string[] }>();
  for (const [old, line] of lines) {
    const now = line?.checks ?? [];
    const key = JSON.stringify([old.checks, now]);
    const group = groups.get(key) ?? { was: old.checks, now, labels: [] };
    group.labels.push(line?.label ?? old.label);
    groups.set(key, group);
  }
  const all = groups.size === 1;
  return [...groups.values()].flatMap(({ was, now, labels }) =>
    changesInChecks(was, now, all ? 'of every piece' : `of ${joinWords(labels)}`),
  );
}

/** Changes in one list of checks; a check is the same one by its id. */
export function changesInChecks(was: readonly Check[], now: readonly Check[], where: string): Phrase[] {
  const find = (checks: readonly Check[], { id }: Check) => checks.find((check) => check.id === id);
  const gone = was.filter((check) => !find(now, check));
  const added = now.filter((check) => !find(was, check));
  return [
    ...gone.map(({ label }): Phrase => [`Check ${where} taken out: ${label}.`]),
    ...added.map((check): Phrase => [`Check ${where} added: ${check.label}, ${levelWords(check)}.`]),
    ...now.flatMap((check) => {
      const old = find(was, check);
      return old ? changesOfCheck(old, check, where) : [];
    }),
    ...orderChange(was, now, where),
  ];
}

function changesOfCheck(old: Check, check: Check, where: string): Phrase[] {
  const [was, now] = [levelWords(old), levelWords(check)];
  return [
    ...(old.label === check.label
      ? []
      : [nowWas(`name of a check ${where}`, quoted(check.label), quoted(old.label))]),
    ...(was === now ? [] : [nowWas(`check ${where}, ${check.label}`, now, was)]),
  ];
}

/** "clean 0, torn 1; taken as clean" */
export function levelWords({ levels, assume }: Check): string {
  const words = levels.map(({ label, lose }) => `${label} ${pointsAsTyped(lose)}`).join(', ');
  const assumed = assume === null ? undefined : levels[assume];
  if (!assumed) return `${words}; nothing taken for granted`;
  const alike = levels.filter(({ label }) => label === assumed.label).length > 1;
  return `${words}; taken as ${assumed.label}${alike ? `, level ${(assume ?? 0) + 1}` : ''}`;
}

function orderChange(was: readonly Check[], now: readonly Check[], where: string): Phrase[] {
  const ids = (checks: readonly Check[], others: readonly Check[]) =>
    checks.map(({ id }) => id).filter((id) => others.some((other) => other.id === id));
  if (ids(was, now).join() === ids(now, was).join()) return [];
  return [[`Order of the checks ${where}: now ${now.map(({ label }) => label).join(', ')}.`]];
}
