import type { RubricForm } from '@/lib/scoring/rubric-form';
import { compareRubrics } from './compare-rubrics';
import type { Phrase } from './compare-types';
import type { DraftLine, PracticalDraft } from './draft';
import { draftOf } from './draft-of';
import { draftDifferences } from './field-names';
import { parseDraft } from './parse-draft';
import type { Task } from './task';

interface Published {
  number: number;
  task: Task;
  form: RubricForm;
}

/**
 * A draft with the prices, checks and rules of another practical's version, and its own words, blank and sizes. A line
 * that the version does not have keeps what it is priced at. Pure; shares nothing with its arguments.
 *
 * @example takePrices(version3, draft).all.worth // as version 3 has it
 */
export function takePrices({ task, form }: Published, draft: PracticalDraft): PracticalDraft {
  const { all, workChecks, total, reading, late, redo, prediction, presets, lines } = draftOf(task, form);
  const priced = new Map(lines.map((line) => [line.id, line]));
  return structuredClone({
    ...draft,
    ...{ all, workChecks, total, reading, late, redo, prediction, presets },
    lines: draft.lines.map((line) => pricedAs(priced.get(line.id), line)),
  });
}

function pricedAs(original: DraftLine | undefined, line: DraftLine): DraftLine {
  if (!original) return line;
  const { worth, missing, sizes, checks, swap, set } = original;
  return { ...line, worth, missing, sizes, checks, swap, set };
}

const MOST_FIELDS = 12;

/**
 * Where a draft's prices are others than a version of its original has, a sentence each; empty where they cost the
 * same. A draft that cannot be read yet is told by its fields. Pure; never fails.
 *
 * @example priceDifferences(version3, takePrices(version3, draft)) // []
 */
export function priceDifferences(version: Published, draft: PracticalDraft): Phrase[] {
  const taken = takePrices(version, draft);
  const [now, then] = [parseDraft(withTitle(draft)), parseDraft(withTitle(taken))];
  if (now.ok && then.ok) {
    const { same, sentences } = compareRubrics([
      { ...now, label: 'this variant' },
      { ...then, label: `version ${version.number}` },
    ]);
    return same ? [] : sentences;
  }
  const fields = draftDifferences(draft, taken);
  const told = fields.slice(0, MOST_FIELDS).map(({ name, here, there }): Phrase => {
    return [`${name}: ${here || 'empty'} here, ${there || 'empty'} in version ${version.number}.`];
  });
  const more = fields.length - MOST_FIELDS;
  return more > 0 ? [...told, [`And ${more} more ${more === 1 ? 'field' : 'fields'}.`]] : told;
}

/** A title that is not typed yet hides no difference. */
function withTitle(draft: PracticalDraft): PracticalDraft {
  return { ...draft, title: 'the same' };
}
