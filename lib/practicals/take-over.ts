import type { RubricForm } from '@/lib/scoring/rubric-form';
import { changesSince } from './changes-since';
import type { Phrase } from './compare-types';
import type { PracticalDraft } from './draft';
import { draftOf } from './draft-of';
import { draftDifferences } from './field-names';
import { parseDraft } from './parse-draft';
import type { Task } from './task';

/** What a practical is to the version it was taken from. */
export type SourceKind = 'copy' | 'adopted' | 'variant';

interface Published {
  task: Task;
  form: RubricForm;
}

/**
 * A draft as it reads when a version of its original is taken over into it: the title stays the teacher's.
 * Pure; does not change its arguments.
 *
 * @example takeOver(version2, draft) // version 2 as a draft, under the draft's title
 */
export function takeOver(original: Published, draft: PracticalDraft): PracticalDraft {
  return { ...draftOf(original.task, original.form), title: draft.title };
}

const MOST_FIELDS = 12;

/**
 * What a teacher has made otherwise in a draft than in the version it was taken from, a sentence each, its title aside:
 * all that goes when another version is taken over. A draft that cannot be read yet is told by its fields.
 * Pure; never fails.
 *
 * @example ownDifferences(draftOf(task, form), { task, form, number: 1 }) // []
 */
export function ownDifferences(draft: PracticalDraft, source: Published & { number: number }): Phrase[] {
  const base = takeOver(source, draft);
  const [before, now] = [parseDraft(withTitle(base)), parseDraft(withTitle(draft))];
  if (before.ok && now.ok) {
    return changesSince({ ...before, number: source.number }, { ...now, called: 'your draft' });
  }
  const fields = draftDifferences(draft, base).filter(({ path }) => path !== 'title');
  const told = fields.slice(0, MOST_FIELDS).map(({ name, here, there }): Phrase => {
    return [`${name}: now ${here || 'empty'}, was ${there || 'empty'}.`];
  });
  const more = fields.length - MOST_FIELDS;
  return more > 0 ? [...told, [`And ${more} more ${more === 1 ? 'field' : 'fields'}.`]] : told;
}

/** A title that is not typed yet hides no difference. */
function withTitle(draft: PracticalDraft): PracticalDraft {
  return { ...draft, title: 'the same' };
}
