import 'server-only';
import { createHash } from 'node:crypto';
import type { Transaction } from '@/db/client';
import { selectKnownPeople } from '@/db/queries/rosters';
import type { SectionRow } from '@/db/queries/sections';
import type { Actor } from '@/lib/auth/actor';
import type { RosterChoice } from '@/lib/contracts/sections';
import { type ReadRoster, type RosterLine, type RosterText, readRoster } from '@/lib/csv/read-roster';
import { type JudgedLine, judgeRoster, type KnownPerson } from './judge-roster';
import { choicesFor } from './plan-import';

export interface RosterRowView {
  line: number;
  localId: string;
  familyName: string;
  givenName: string;
  kind: JudgedLine['verdict']['kind'];
  problems: string[];
  /** Whom the school has under this ID, or the section under this name. */
  known: { localId: string | null; familyName: string; givenName: string } | null;
  choices: RosterChoice[];
}

export interface Judged {
  read: Extract<ReadRoster, { ok: true }>;
  judged: JudgedLine[];
  rows: RosterRowView[];
  /** A mark of all that was judged: equal as long as text and school say the same. */
  seen: string;
}

/** Reads the text and judges each line against the school as it is now. */
export async function judgeRosterText(
  tx: Transaction,
  actor: Actor,
  section: SectionRow,
  roster: RosterText,
): Promise<Judged | { reason: string }> {
  const read = readRoster(roster);
  if (!read.ok) return { reason: read.reason };
  const judged = await judgeLines(tx, actor, section, read.lines);
  const rows = judged.map(asRowView);
  const seen = createHash('sha256')
    .update(JSON.stringify({ sectionId: section.sectionId, rows }))
    .digest('hex');
  return { read, judged, rows, seen };
}

/** Judges lines against everybody of the school whom they could mean. */
export async function judgeLines(
  tx: Transaction,
  actor: Actor,
  { sectionId }: SectionRow,
  lines: readonly RosterLine[],
): Promise<JudgedLine[]> {
  const localIds = [
    ...new Set(
      lines.flatMap(({ localId, problems }) => (localId === '' || problems.length > 0 ? [] : [localId])),
    ),
  ];
  const rows = await selectKnownPeople(tx, actor.schoolId, {
    sectionId,
    teacherId: actor.personId,
    localIds,
  });
  const known = rows.map(
    ({ left, isStaff, joinedOn, here, ...person }): KnownPerson => ({
      ...person,
      mine: person.mine || actor.role === 'admin',
      barred: left ? 'left' : isStaff ? 'works here' : null,
      enrolled: joinedOn === null ? null : here ? 'now' : 'earlier',
    }),
  );
  return judgeRoster(lines, known);
}

function asRowView({ verdict, problems: _, ...line }: JudgedLine): RosterRowView {
  const person = 'person' in verdict ? verdict.person : null;
  const known = person && {
    localId: person.localId,
    familyName: person.familyName,
    givenName: person.givenName,
  };
  return {
    ...line,
    kind: verdict.kind,
    problems: verdict.kind === 'problem' ? verdict.problems : [],
    known,
    choices: choicesFor(verdict),
  };
}
