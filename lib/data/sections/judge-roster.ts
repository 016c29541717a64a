import { nameKey, type RosterLine } from '@/lib/csv/read-roster';

/** Somebody of the school whom a line may mean, as far as the roster asks. */
export interface KnownPerson {
  personId: string;
  localId: string | null;
  familyName: string;
  givenName: string;
  /** Also works here, or has left the school: neither comes in by a roster. */
  barred: 'works here' | 'left' | null;
  /** In a section of the person who imports, now or earlier. */
  mine: boolean;
  /** In this section. */
  enrolled: 'now' | 'earlier' | null;
}

export type RosterVerdict =
  | { kind: 'problem'; problems: string[] }
  /** Not known in the school; an ID of null is made at the import. */
  | { kind: 'new'; localId: string | null }
  | { kind: 'joins' | 'returns' | 'unchanged'; person: KnownPerson }
  /** The ID belongs to somebody of another name. */
  | { kind: 'name-conflict'; person: KnownPerson; mayRename: boolean }
  /** The name is on the roster already, under another ID. */
  | { kind: 'id-conflict'; person: KnownPerson };

export interface JudgedLine extends RosterLine {
  verdict: RosterVerdict;
}

/**
 * What each line would do, given everybody of the school who has one of the IDs or is on the section's roster. An ID
 * tells a person; without one the name does, among those of the section alone.
 */
export function judgeRoster(lines: readonly RosterLine[], known: readonly KnownPerson[]): JudgedLine[] {
  const byId = new Map(
    known.flatMap((person) => (person.localId === null ? [] : [[person.localId, person]])),
  );
  const byName = new Map<string, KnownPerson[]>();
  for (const person of known.filter(({ enrolled }) => enrolled !== null)) {
    byName.set(nameKey(person), [...(byName.get(nameKey(person)) ?? []), person]);
  }
  const ids = new Set(lines.map(({ localId }) => localId));
  return lines.map((line) => {
    if (line.problems.length > 0) return { ...line, verdict: { kind: 'problem', problems: line.problems } };
    const namesakes = byName.get(nameKey(line)) ?? [];
    const person = line.localId === '' ? undefined : byId.get(line.localId);
    if (person) return { ...line, verdict: judgeKnown(line, person) };
    return { ...line, verdict: judgeByName(line, namesakes, ids) };
  });
}

function judgeKnown(line: RosterLine, person: KnownPerson): RosterVerdict {
  if (person.barred !== null) {
    const why =
      person.barred === 'left'
        ? `The ID ${line.localId} belongs to somebody who has left the school. The office can bring them back.`
        : `The ID ${line.localId} belongs to somebody who works here. Check it against the school’s list.`;
    return { kind: 'problem', problems: [why] };
  }
  if (nameKey(line) !== nameKey(person)) return { kind: 'name-conflict', person, mayRename: person.mine };
  return verdictOf(person);
}

function verdictOf(person: KnownPerson): RosterVerdict {
  if (person.enrolled === 'now') return { kind: 'unchanged', person };
  return { kind: person.enrolled === 'earlier' ? 'returns' : 'joins', person };
}

function judgeByName(line: RosterLine, namesakes: KnownPerson[], ids: ReadonlySet<string>): RosterVerdict {
  const [one, another] = namesakes;
  if (line.localId === '') {
    if (another) {
      return {
        kind: 'problem',
        problems: [
          `The roster has ${namesakes.length} students of this name. Give the ID of the one you mean.`,
        ],
      };
    }
    return one && one.barred === null ? verdictOf(one) : { kind: 'new', localId: null };
  }
  // A namesake whose own ID is in the text too is somebody else.
  const twin = namesakes.find(
    ({ localId, barred }) => barred === null && !(localId !== null && ids.has(localId)),
  );
  return twin ? { kind: 'id-conflict', person: twin } : { kind: 'new', localId: line.localId };
}
