import type { RosterChoice } from '@/lib/contracts/sections';
import type { FieldErrors } from '@/lib/result';
import type { JudgedLine, KnownPerson, RosterVerdict } from './judge-roster';

export interface ImportPlan {
  /** Not in the school yet; an ID of null is made. */
  added: { localId: string | null; familyName: string; givenName: string }[];
  /** In the school, not in the section. */
  enrolled: KnownPerson[];
  renamed: { person: KnownPerson; familyName: string; givenName: string }[];
  renumbered: { person: KnownPerson; localId: string }[];
  unchanged: number;
  leftOut: number;
}

/** What a teacher may choose for a line; none where there is nothing to choose. */
export function choicesFor(verdict: RosterVerdict): RosterChoice[] {
  if (verdict.kind === 'name-conflict')
    return verdict.mayRename ? ['keep', 'rename', 'skip'] : ['keep', 'skip'];
  return verdict.kind === 'id-conflict' ? ['renumber', 'add', 'skip'] : [];
}

/**
 * What an import writes, by what each line is and what was chosen for it; or messages at the lines that still need a
 * choice. Lines with problems are left out if that was asked for, and otherwise hold the import up.
 */
export function planImport(
  judged: readonly JudgedLine[],
  choices: Readonly<Record<string, RosterChoice>>,
  leaveOutProblems: boolean,
): { ok: true; plan: ImportPlan } | { ok: false; fields: FieldErrors } {
  const plan: ImportPlan = { added: [], enrolled: [], renamed: [], renumbered: [], unchanged: 0, leftOut: 0 };
  const fields: FieldErrors = {};
  for (const line of judged) {
    const problem =
      line.verdict.kind === 'problem' && !leaveOutProblems
        ? (line.verdict.problems[0] ?? 'This row cannot be used.')
        : place(plan, line, choices[String(line.line)]);
    if (problem !== null) fields[`choices.${line.line}`] = [problem];
  }
  return Object.keys(fields).length > 0 ? { ok: false, fields } : { ok: true, plan };
}

function place(plan: ImportPlan, line: JudgedLine, choice: RosterChoice | undefined): string | null {
  const { verdict, familyName, givenName } = line;
  const allowed = choicesFor(verdict);
  if (allowed.length > 0 && (choice === undefined || !allowed.includes(choice))) {
    return `Line ${line.line}: choose which of the two holds.`;
  }
  if (verdict.kind === 'problem' || choice === 'skip') plan.leftOut += 1;
  else if (verdict.kind === 'new') plan.added.push({ localId: verdict.localId, familyName, givenName });
  else if (verdict.kind === 'unchanged') plan.unchanged += 1;
  else if (verdict.kind === 'name-conflict') placeNamed(plan, line, verdict.person, choice);
  else if (verdict.kind === 'id-conflict') return placeNumbered(plan, line, verdict.person, choice);
  else plan.enrolled.push(verdict.person);
  return null;
}

function placeNamed(
  plan: ImportPlan,
  { familyName, givenName }: JudgedLine,
  person: KnownPerson,
  choice: RosterChoice | undefined,
): void {
  const isNew = person.enrolled !== 'now';
  if (choice === 'rename') plan.renamed.push({ person, familyName, givenName });
  if (isNew) plan.enrolled.push(person);
  if (choice === 'keep' && !isNew) plan.unchanged += 1;
}

function placeNumbered(
  plan: ImportPlan,
  { line, localId, familyName, givenName }: JudgedLine,
  person: KnownPerson,
  choice: RosterChoice | undefined,
): string | null {
  if (choice === 'add') {
    plan.added.push({ localId, familyName, givenName });
    return null;
  }
  if (plan.renumbered.some((other) => other.person.personId === person.personId)) {
    return `Line ${line}: another line gives this student a new ID already. Choose “another student” in one of them.`;
  }
  plan.renumbered.push({ person, localId });
  if (person.enrolled !== 'now') plan.enrolled.push(person);
  return null;
}

/** Whether the plan would write anything. */
export function changesAnything(plan: ImportPlan): boolean {
  return [plan.added, plan.enrolled, plan.renamed, plan.renumbered].some((list) => list.length > 0);
}
