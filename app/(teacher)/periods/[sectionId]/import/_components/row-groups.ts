import type { RosterRowView } from '@/lib/data/sections/roster-preview';
import { sayName } from '../../../_components/words';

export interface RowGroups {
  problems: RosterRowView[];
  conflicts: RosterRowView[];
  coming: RosterRowView[];
  unchanged: RosterRowView[];
}

/** The rows of a preview by what they ask of the teacher. */
export function groupRows(rows: readonly RosterRowView[]): RowGroups {
  const groups: RowGroups = { problems: [], conflicts: [], coming: [], unchanged: [] };
  for (const row of rows) groups[groupOf(row)].push(row);
  return groups;
}

function groupOf({ kind }: RosterRowView): keyof RowGroups {
  switch (kind) {
    case 'problem':
      return 'problems';
    case 'name-conflict':
    case 'id-conflict':
      return 'conflicts';
    case 'new':
    case 'joins':
    case 'returns':
      return 'coming';
    case 'unchanged':
      return 'unchanged';
  }
}

/** What stands above the rows: `21 students come in. 3 rows cannot be used.` */
export function sayGroups({ problems, conflicts, coming, unchanged }: RowGroups): string {
  const parts = [
    coming.length > 0 ? count(coming.length, 'One student comes in.', 'students come in.') : null,
    conflicts.length > 0 ? count(conflicts.length, 'One row needs your word.', 'rows need your word.') : null,
    problems.length > 0 ? count(problems.length, 'One row cannot be used.', 'rows cannot be used.') : null,
    coming.length + conflicts.length === 0 && unchanged.length > 0 ? sayUnchanged(unchanged.length) : null,
  ];
  return parts.filter(Boolean).join(' ');
}

export function sayUnchanged(many: number): string {
  return many === 1
    ? 'Nothing changes: the one student is on the roster already.'
    : `Nothing changes: ${many} students are on the roster already.`;
}

export function count(many: number, one: string, several: string): string {
  return many === 1 ? one : `${many} ${several}`;
}

/** The row as it was written, for sentences: `“Abara, Chidi”`. */
export function quoteName(name: { familyName: string; givenName: string }): string {
  return `“${sayName(name)}”`;
}
