import type { Axis } from '@/lib/scoring';
import type { PracticalDraft } from './draft';

/** What a review of the compiled rubric says, by line and axis. */
export interface RubricFinding {
  code: string;
  lineId?: string;
  axis?: Axis;
  text: string;
}

/** The same at the field that causes it; `setTo` settles it when typed there. `isNote`: for information only. */
export interface PlacedFinding {
  path: string;
  code: string;
  text: string;
  setTo: string | null;
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
 * of its own. The same finding of several lines stands once at a shared field. Pure.
 */
export function placeFindings(draft: PracticalDraft, findings: readonly RubricFinding[]): PlacedFinding[] {
  const placed = new Map<string, PlacedFinding>();
  for (const { code, text, lineId, axis } of findings) {
    const path = AT_FIELD[code] ?? pathOf(draft, code, lineId, axis);
    const key = `${path} ${code}`;
    if (placed.has(key)) continue;
    placed.set(key, {
      path,
      code,
      text: withoutPlace(text),
      setTo: code === 'missing-is-cheaper' ? 'worth' : null,
      isNote: code === 'symmetric-undersize',
    });
  }
  return [...placed.values()];
}

/** Beside its field a finding need not name the line and axis again. */
function withoutPlace(text: string): string {
  const rest = text.replace(/^“[^”]*”(?:, (?:thickness|width|length))?: /, '');
  return rest.charAt(0).toUpperCase() + rest.slice(1);
}

function pathOf(draft: PracticalDraft, code: string, lineId?: string, axis?: Axis): string {
  const index = draft.lines.findIndex(({ id }) => id === lineId);
  const line = draft.lines[index];
  if (code === 'missing-is-cheaper') {
    return line && line.missing.trim() !== '' ? `lines.${index}.missing` : 'all.missing';
  }
  if (axis) return line?.sizes[axis] ? `lines.${index}.sizes.${axis}` : `all.sizes.${axis}`;
  return line ? `lines.${index}.label` : '';
}
