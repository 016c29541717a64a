import type { Check } from '@/lib/scoring';
import type { DraftCheck } from './draft';
import type { FieldReader } from './field-reader';

/** Checks from their typed fields: each has a name of its own, and its first level costs nothing. */
export function parseChecks(reader: FieldReader, path: string, checks: readonly DraftCheck[]): Check[] {
  const names = new Set<string>();
  return checks.map((check, index) => {
    const at = `${path}.${index}`;
    const label = reader.text(`${at}.label`, check.label, 60, 'Name the check.');
    if (names.has(label.toLowerCase())) reader.refuse(`${at}.label`, 'Another check has this name.');
    if (label !== '') names.add(label.toLowerCase());
    const levels = check.levels.map((level, place) => ({
      label: reader.text(
        `${at}.levels.${place}.label`,
        level.label,
        60,
        place === 0 ? 'Name what passes.' : 'Name this fault.',
      ),
      lose: place === 0 ? 0 : reader.points(`${at}.levels.${place}.lose`, level.lose),
    }));
    if (check.assume !== null && !levels[check.assume]) {
      reader.refuse(`${at}.assume`, 'Choose what passes or one of the faults.');
    }
    return { id: check.id, label, levels, assume: check.assume };
  });
}
