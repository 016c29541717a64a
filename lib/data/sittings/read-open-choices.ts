import 'server-only';
import { selectSections } from '@/db/queries/sections';
import { selectGivenPracticals, selectVersionsToGive } from '@/db/queries/sittings';
import { openChoicesInput } from '@/lib/contracts/sittings';
import { asSectionView, type SectionView } from '../sections/section-view';
import { defineVerb } from '../verb';
import { type VariantFamily, variantFamilies } from './variant-families';

export interface OpenChoicesView {
  sections: (SectionView & { versions: VersionChoice[] })[];
  families: VariantFamily[];
}

export interface VersionChoice {
  versionId: string;
  practicalId: string;
  title: string;
  number: number;
  latest: boolean;
  /** It stands approved as the department's. */
  approved: boolean;
  /** Whose practical it is, when it is a colleague's. */
  ownerName: string | null;
}

/** The sections that a sitting can be opened for, each with the versions it does not have yet, the latest first. */
export const readOpenChoices = defineVerb({
  action: 'sitting.open',
  input: openChoicesInput,
  async run({ actor, tx }): Promise<OpenChoicesView> {
    const { schoolId, personId } = actor;
    const sections = await selectSections(tx, schoolId, { teacherId: personId });
    const ids = sections.map(({ sectionId }) => sectionId);
    const given = ids.length > 0 ? await selectGivenPracticals(tx, schoolId, ids) : [];
    const departments = new Map<string, Awaited<ReturnType<typeof selectVersionsToGive>>>();
    for (const { departmentId } of sections) {
      if (departments.has(departmentId)) continue;
      departments.set(departmentId, await selectVersionsToGive(tx, schoolId, { departmentId, personId }));
    }
    const periodOf = new Map(sections.map(({ sectionId, period }) => [sectionId, period]));
    const have = given.map((row) => ({ ...row, period: periodOf.get(row.sectionId) ?? '' }));
    return {
      families: await variantFamilies(tx, schoolId, [...departments.values()].flat(), have),
      sections: sections.map((section) => {
        const has = new Set(
          given.flatMap((row) => (row.sectionId === section.sectionId ? [row.practicalId] : [])),
        );
        const all = departments.get(section.departmentId) ?? [];
        const free = all.filter(({ practicalId }) => !has.has(practicalId));
        return { ...asSectionView(section), versions: latestFirst(free) };
      }),
    };
  },
});

type VersionRow = Awaited<ReturnType<typeof selectVersionsToGive>>[number];

function latestFirst(rows: readonly VersionRow[]): VersionChoice[] {
  const seen = new Set<string>();
  const choices = rows.map(({ versionId, practicalId, title, number, approved, own, ownerName }) => {
    const latest = !seen.has(practicalId);
    seen.add(practicalId);
    return { versionId, practicalId, title, number, latest, approved, ownerName: own ? null : ownerName };
  });
  return [...choices.filter(({ latest }) => latest), ...choices.filter(({ latest }) => !latest)];
}
