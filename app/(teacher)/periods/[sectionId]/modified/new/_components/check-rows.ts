import type { TypedModification } from '@/lib/contracts/accommodations';
import type { DeskSitting } from '@/lib/data/accommodations/read-accommodation-desk';
import type { Check } from '@/lib/scoring';
import { isSameLabel } from '@/lib/scoring/modification';

/** A check by its label, as it is priced where it comes first. */
export interface CheckRow {
  label: string;
  /** `piece`: of every piece that has it; `work`: once. */
  of: 'piece' | 'work';
  levels: Check['levels'];
}

type TypedCheck = TypedModification['checks'][number];

/** The checks of these sittings, each label once, and those of a modification that none of them has. */
export function checkRows(sittings: readonly DeskSitting[], typed: readonly TypedCheck[]): CheckRow[] {
  const rows: CheckRow[] = [];
  const add = (row: CheckRow) => {
    const known = rows.find(({ label }) => isSameLabel(label, row.label));
    if (!known) rows.push(row);
    else if (row.levels.length > known.levels.length) known.levels = row.levels;
  };
  for (const { rubric } of sittings) {
    for (const { label, levels } of rubric.lines.flatMap((line) => line.checks)) {
      add({ label, of: 'piece', levels });
    }
    for (const { label, levels } of rubric.workChecks) add({ label, of: 'work', levels });
  }
  for (const { label, lose } of typed) {
    const levels = ['', ...lose].map((_, index) => ({ label: `level ${index + 1}`, lose: 0 }));
    add({ label, of: 'piece', levels });
  }
  return rows.filter(({ levels }) => levels.length > 1);
}

/** What stands in the form for each check: as the rubric has it where nothing was typed. */
export function typedChecks(rows: readonly CheckRow[], typed: readonly TypedCheck[]): TypedCheck[] {
  return rows.map(({ label, levels }) => {
    const prices = levels.slice(1).map(({ lose }) => String(lose / 100));
    const found = typed.find((each) => isSameLabel(each.label, label));
    if (!found) return { label, as: 'rubric', lose: prices };
    return { label, as: found.as, lose: prices.map((price, index) => found.lose[index] ?? price) };
  });
}
