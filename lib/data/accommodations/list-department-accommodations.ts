import 'server-only';
import { type AccommodationRow, selectAccommodations } from '@/db/queries/accommodation-lists';
import { selectSections } from '@/db/queries/sections';
import { departmentAccommodationsInput } from '@/lib/contracts/accommodations';
import { asSectionView, type SectionView } from '../sections/section-view';
import { defineVerb } from '../verb';
import { type AccommodationView, asAccommodationView } from './accommodation-view';

export interface DepartmentAccommodationsView {
  /** Sections with a modified rubric, as the department's list has them. */
  sections: (SectionView & { accommodations: AccommodationView[] })[];
  /** Those whose student is in none of the department's sections any more. */
  elsewhere: AccommodationView[];
}

/** The modified rubrics of a head's department, by section; those that stand come before those that have ended. */
export const listDepartmentAccommodations = defineVerb({
  action: 'accommodation.list',
  input: departmentAccommodationsInput,
  async run({ actor, tx, authorize, found, logView }): Promise<DepartmentAccommodationsView> {
    const { schoolId } = actor;
    const departmentId = found(actor.role === 'head' ? actor.departmentId : null);
    authorize({ schoolId, departmentId });
    const rows = await selectAccommodations(tx, schoolId, { departmentId });
    const sections = await selectSections(tx, schoolId, { departmentId });
    await logView({
      subjectKind: 'department',
      subjectId: departmentId,
      details: { modifiedRubrics: rows.length },
    });
    const known = new Set(sections.map(({ sectionId }) => sectionId));
    return {
      sections: sections
        .map((section) => ({
          ...asSectionView(section),
          accommodations: asViews(rows.filter(({ sectionIds }) => sectionIds.includes(section.sectionId))),
        }))
        .filter(({ accommodations }) => accommodations.length > 0),
      elsewhere: asViews(rows.filter(({ sectionIds }) => !sectionIds.some((id) => known.has(id)))),
    };
  },
});

function asViews(rows: readonly AccommodationRow[]): AccommodationView[] {
  const views = rows.map(asAccommodationView);
  return [...views.filter(({ ended }) => !ended), ...views.filter(({ ended }) => ended)];
}
