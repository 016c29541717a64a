import type { Axis, Rubric } from '@/lib/scoring';
import type { PracticalDraft } from './draft';
import { type FindingFix, fixOf } from './finding-fixes';

/** What a review of the compiled rubric says, by line and axis. */
export interface RubricFinding {
  code: string;
  lineId?: string;
  axis?: Axis;
  text: string;
}

/** The same at the field that causes it. `isNote`: for information only. */
export interface PlacedFinding {
  path: string;
  code: string;
  text: string;
  fix: FindingFix | null;
  isNote: boolean;
}

const AT_FIELD: Record<string, string> = {
  'rounding-and-margin': 'reading.readTo',
  'gross-inside-band': 'reading.grossLimit',
  'start-runs-out': 'total.start',
  'total-off-grid': 'total.roundTo',
};

/**
 * Puts each finding at the field of the draft that it comes from: at all lines' field where the line has no exception
 * of its own, with the one press that settles it where that is clear. The same finding of several lines stands once at
 * a shared field, and its press settles all of them. `rubric` is what the draft compiles to. Pure.
 */
export function placeFindings(
  draft: PracticalDraft,
  rubric: Rubric,
  findings: readonly RubricFinding[],
): PlacedFinding[] {
  const groups = new Map<string, { path: string; first: RubricFinding; all: RubricFinding[] }>();
  for (const finding of findings) {
    const path = AT_FIELD[finding.code] ?? pathOf(draft, finding);
    const key = `${path} ${finding.code}`;
    const group = groups.get(key) ?? { path, first: finding, all: [] };
    group.all.push(finding);
    groups.set(key, group);
  }
  return [...groups.values()].map(({ path, first, all }) => ({
    path,
    code: first.code,
    text: withoutPlace(first.text),
    fix: fixOf(path, all, draft, rubric),
    isNote: first.code === 'symmetric-undersize',
  }));
}

/** Beside its field a finding need not name the line and axis again. */
function withoutPlace(text: string): string {
  const rest = text.replace(/^“[^”]*”(?:, (?:thickness|width|length))?: /, '');
  return rest.charAt(0).toUpperCase() + rest.slice(1);
}

function pathOf(draft: PracticalDraft, { code, lineId, axis }: RubricFinding): string {
  const index = draft.lines.findIndex(({ id }) => id === lineId);
  const line = draft.lines[index];
  if (code === 'missing-is-cheaper') {
    return line && line.missing.trim() !== '' ? `lines.${index}.missing` : 'all.missing';
  }
  if (axis) return line?.sizes[axis] ? `lines.${index}.sizes.${axis}` : `all.sizes.${axis}`;
  return line ? `lines.${index}.label` : '';
}
