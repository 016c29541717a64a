import type { Compared } from '@/lib/practicals/compare-types';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { parseDraft } from '@/lib/practicals/parse-draft';
import type { StarterId } from '@/lib/practicals/starter-plans';
import { starterDraft } from '@/lib/practicals/starters';

/** A starter's rubric, with something typed otherwise, by the name it is compared under. */
export function comparedStarter(
  label: string,
  change: (draft: PracticalDraft) => void = () => {},
  starter: StarterId = 'desk-caddy',
): Compared {
  const draft = starterDraft(starter);
  change(draft);
  const read = parseDraft(draft);
  if (!read.ok) throw new Error(JSON.stringify(read.errors));
  return { label, task: read.task, form: read.form, rubric: read.rubric };
}
