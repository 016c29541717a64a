import type { RubricForm } from '@/lib/scoring/rubric-form';
import { changesSince } from './changes-since';
import type { Phrase } from './compare-types';
import type { DraftLine, PracticalDraft } from './draft';
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
 * A draft as it reads when a version of its original is taken over into it. The title stays the teacher's. A variant
 * keeps its own sizes and blank too and takes the rest; null when that cannot be done, as the version has other lines.
 * Pure; does not change its arguments.
 *
 * @example takeOver(version2, draft, 'adopted') // version 2 as a draft, under the draft's title
 */
export function takeOver(
  original: Published,
  draft: PracticalDraft,
  kind: SourceKind,
): PracticalDraft | null {
  const taken: PracticalDraft = { ...draftOf(original.task, original.form), title: draft.title };
  if (kind !== 'variant') return taken;
  const lines = taken.lines.map((line) => withSizesOf(line, draft.lines));
  if (taken.lines.length !== draft.lines.length) return null;
  if (!lines.every((line) => line !== null)) return null;
  return { ...taken, blank: draft.blank, lines };
}

function withSizesOf(line: DraftLine, own: readonly DraftLine[]): DraftLine | null {
  const mine = own.find(({ id }) => id === line.id);
  if (!mine || mine.quantity.trim() !== line.quantity) return null;
  return { ...line, thickness: mine.thickness, width: mine.width, length: mine.length };
}

const MOST_FIELDS = 12;

/**
 * What a teacher has made otherwise in a draft than in the version it was taken from, a sentence each, its title aside:
 * all that goes when another version is taken over. A draft that cannot be read yet is told by its fields.
 * Pure; never fails.
 *
 * @example ownDifferences(draftOf(task, form), { task, form }, 'adopted') // []
 */
export function ownDifferences(draft: PracticalDraft, source: Published, kind: SourceKind): Phrase[] {
  const base = takeOver(source, draft, kind) ?? takeOver(source, draft, 'adopted');
  if (!base) return [];
  const [before, now] = [parseDraft(withTitle(base)), parseDraft(withTitle(draft))];
  if (before.ok && now.ok) return changesSince({ ...before, number: 1 }, now);
  const fields = draftDifferences(draft, base).filter(({ path }) => path !== 'title');
  const told = fields.slice(0, MOST_FIELDS).map(({ name, here, there }): Phrase => {
    return [`${name}: now ${here || 'empty'}, was ${there || 'empty'}.`];
  });
  const more = fields.length - MOST_FIELDS;
  return more > 0 ? [...told, [`And ${more} more fields.`]] : told;
}

/** A title that is not typed yet hides no difference. */
function withTitle(draft: PracticalDraft): PracticalDraft {
  return { ...draft, title: 'the same' };
}
