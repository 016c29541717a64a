import 'server-only';
import type { Transaction } from '@/db/client';
import { selectOriginals } from '@/db/queries/variants';
import { letterOf } from '@/lib/practicals/propose-variants-letters';

/** A practical with its variants, as far as they are published, and which of one's periods have which. */
export interface VariantFamily {
  practicalIds: string[];
  members: VariantMember[];
}

export interface VariantMember {
  practicalId: string;
  /** The version of it that was published last. */
  versionId: string;
  /** "original", "variant B". */
  name: string;
  periods: string[];
}

interface PublishedVersion {
  versionId: string;
  practicalId: string;
  title: string;
  number: number;
}

interface Given {
  practicalId: string;
  period: string;
}

/** Those practicals of which several sizes are published. */
export async function variantFamilies(
  tx: Transaction,
  schoolId: string,
  versions: readonly PublishedVersion[],
  given: readonly Given[],
): Promise<VariantFamily[]> {
  const latest = latestOf(versions);
  const ids = latest.map(({ practicalId }) => practicalId);
  const originals = ids.length > 0 ? await selectOriginals(tx, schoolId, ids) : [];
  const rootOf = new Map(originals.map(({ practicalId, of }) => [practicalId, of]));
  const families = new Map<string, VariantMember[]>();
  for (const { practicalId, versionId, title } of latest) {
    const root = rootOf.get(practicalId);
    const letter = letterOf(title);
    const name = root === undefined ? 'original' : letter ? `variant ${letter}` : title;
    const periods = given.filter((each) => each.practicalId === practicalId).map(({ period }) => period);
    const member = { practicalId, versionId, name, periods: [...new Set(periods)] };
    families.set(root ?? practicalId, [...(families.get(root ?? practicalId) ?? []), member]);
  }
  return [...families.values()]
    .filter((members) => members.length > 1)
    .map((members) => ({
      practicalIds: members.map(({ practicalId }) => practicalId),
      members: members.sort((a, b) => rank(a.name) - rank(b.name) || (a.name < b.name ? -1 : 1)),
    }));
}

function latestOf(versions: readonly PublishedVersion[]): PublishedVersion[] {
  const latest = new Map<string, PublishedVersion>();
  for (const version of versions) {
    const known = latest.get(version.practicalId);
    if (!known || known.number < version.number) latest.set(version.practicalId, version);
  }
  return [...latest.values()];
}

const rank = (name: string) => (name === 'original' ? 0 : 1);
