import type { DraftLine } from './draft';
import type { PlacedFinding } from './place-findings';

/**
 * Lines that are called as one before them: allowed, since their sizes tell them apart, but worth seeing. Case and
 * spaces make no other name. One finding at each later name. Pure.
 *
 * @example reviewLabels([{ ...line, label: 'side' }, { ...line, label: 'Side' }])[0]?.path // 'lines.1.label'
 */
export function reviewLabels(lines: readonly DraftLine[]): PlacedFinding[] {
  const first = new Map<string, number>();
  return lines.flatMap(({ label }, index) => {
    const name = label.trim().replace(/\s+/g, ' ').toLowerCase();
    const before = first.get(name);
    if (name !== '' && before === undefined) first.set(name, index);
    if (name === '' || before === undefined) return [];
    return [
      {
        path: `lines.${index}.label`,
        code: 'same-name',
        text: `Line ${before + 1} has this name too. At the bench only their sizes tell the two apart.`,
        fix: null,
        isNote: true,
      },
    ];
  });
}
