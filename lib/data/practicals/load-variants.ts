import 'server-only';
import { type PracticalRow, selectVersion } from '@/db/queries/practicals';
import { selectLatestVersions, selectPeriodsGiven, selectVariants } from '@/db/queries/variants';
import type { Phrase } from '@/lib/practicals/compare-types';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { letterOf } from '@/lib/practicals/propose-variants-letters';
import type { OtherCutList } from '@/lib/practicals/propose-variants-types';
import { sameInEffect } from '@/lib/practicals/same-in-effect';
import { priceDifferences } from '@/lib/practicals/take-prices';
import type { Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { CutList, RubricForm } from '@/lib/scoring/rubric-form';
import type { Context } from '../verb';
import { storedDraft, storedVersion } from './stored';

export interface PublishedOriginal {
  versionId: string;
  number: number;
  task: Task;
  form: RubricForm;
  rubric: Rubric;
}

export interface VariantView {
  practicalId: string;
  title: string;
  /** The letter of its title, or its title where that was changed. */
  name: string;
  archived: boolean;
  revision: number;
  /** The version of the original that its sizes were derived from. */
  fromNumber: number;
  published: { versionId: string; number: number } | null;
  /** The draft asks for something else than what is published of it. */
  changed: boolean;
  /** As its draft has it; as it was published where the draft cannot be read; null when neither can. */
  cutList: CutList | null;
  /** Where its prices are others than the original's. */
  prices: Phrase[];
  periods: GivenPeriod[];
}

export interface GivenPeriod {
  sittingId: string;
  period: string;
  sectionName: string;
}

type Loading = Pick<Context<unknown>, 'actor' | 'tx'>;

/** A practical's latest version, its variants, and the periods that each of them is given to. */
export async function loadVariants({ actor, tx }: Loading, row: PracticalRow) {
  const { schoolId } = actor;
  const rows = await selectVariants(tx, schoolId, row.id);
  const ids = [row.id, ...rows.map(({ practicalId }) => practicalId)];
  const versions = new Map(
    (await selectLatestVersions(tx, schoolId, ids)).map((version) => [version.practicalId, version]),
  );
  const given = await selectPeriodsGiven(tx, schoolId, ids);
  const periodsOf = (practicalId: string): GivenPeriod[] =>
    given
      .filter((each) => each.practicalId === practicalId)
      .map(({ sittingId, period, sectionName }) => ({ sittingId, period, sectionName }));
  const latest = versions.get(row.id);
  const original: PublishedOriginal | null = latest
    ? { versionId: latest.versionId, number: latest.number, ...storedVersion(latest) }
    : null;
  const variants = rows.map((variant): VariantView => {
    const version = versions.get(variant.practicalId);
    return {
      ...viewOf(storedDraft(variant.content), version ? storedVersion(version) : null, original),
      practicalId: variant.practicalId,
      title: variant.title,
      name: nameOf(variant.title),
      archived: variant.archivedAt !== null,
      revision: variant.revision,
      fromNumber: variant.fromNumber,
      published: version ? { versionId: version.versionId, number: version.number } : null,
      periods: periodsOf(variant.practicalId),
    };
  });
  return { original, variants, periods: periodsOf(row.id) };
}

function nameOf(title: string): string {
  const letter = letterOf(title);
  return letter ? `variant ${letter}` : title;
}

type Written = Omit<PublishedOriginal, 'versionId' | 'number'>;

function viewOf(draft: PracticalDraft, published: Written | null, original: PublishedOriginal | null) {
  const parsed = parseDraft(draft);
  return {
    cutList: parsed.ok ? parsed.task.cutList : (published?.task.cutList ?? null),
    changed: published !== null && !(parsed.ok && sameInEffect(published, parsed)),
    prices: original ? priceDifferences(original, draft) : [],
  };
}

/** What pieces of new variants must not pass for, besides the original. */
export function cutListsOf(variants: readonly VariantView[]): OtherCutList[] {
  return variants.flatMap(({ name, cutList }) => (cutList ? [{ name, cutList }] : []));
}

/** The practical that a variant was made from; null for one that is no variant. */
export async function originalOf({ actor, tx }: Loading, row: PracticalRow) {
  if (row.sourceKind !== 'variant' || !row.copiedFromVersionId) return null;
  const version = await selectVersion(tx, actor.schoolId, row.copiedFromVersionId);
  return version ? { practicalId: version.practicalId, number: version.number } : null;
}
