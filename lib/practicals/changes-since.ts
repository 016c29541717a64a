import { compareRubrics, cutListSignature } from './compare-rubrics';
import type { Compared, Phrase } from './compare-types';

type Written = Omit<Compared, 'label'>;

/** What a draft, or the version numbered, changes of another version, a sentence each. */
export function changesSince(
  before: Written & { number: number },
  now: Written & { number?: number },
): Phrase[] {
  return [...taskChanges(before, now), ...priceChanges(before, now)];
}

function taskChanges({ task: a }: Written, { task: b }: Written): Phrase[] {
  const parts: [changed: boolean, words: string][] = [
    [a.title !== b.title, 'The title is another.'],
    [a.instructions !== b.instructions, 'The instructions are others.'],
    [
      a.material !== b.material ||
        JSON.stringify(sizes(a.blank)) !== JSON.stringify(sizes(b.blank)) ||
        a.kerf !== b.kerf,
      'The blank, its wood or the kerf is another.',
    ],
    [cutListSignature(a) !== cutListSignature(b), 'The cut list asks for other pieces.'],
    [names({ task: a }) !== names({ task: b }), 'Lines are named, ordered or noted otherwise.'],
  ];
  return parts.flatMap(([changed, words]) => (changed ? [[words]] : []));
}

function sizes(blank: Written['task']['blank']) {
  return blank && [blank.thickness, blank.width, blank.length];
}

function names({ task }: Pick<Written, 'task'>): string {
  return JSON.stringify(task.cutList.lines.map(({ id, label }) => [label, task.lineNotes[id] ?? '']));
}

/** Prices can be set against each other only while the pieces are the same. */
function priceChanges(before: Written & { number: number }, now: Written & { number?: number }): Phrase[] {
  if (cutListSignature(before.task) !== cutListSignature(now.task)) return [];
  const comparison = compareRubrics([
    { ...before, label: `version ${before.number}` },
    { ...now, label: `version ${now.number ?? before.number + 1}` },
  ]);
  return comparison.same ? [] : comparison.sentences;
}
