import 'server-only';
import { selectAccommodations } from '@/db/queries/accommodation-lists';
import { selectSection } from '@/db/queries/sections';
import { sectionAccommodationsInput } from '@/lib/contracts/accommodations';
import { asSectionView, type SectionView, sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { type AccommodationView, asAccommodationView } from './accommodation-view';

export interface SectionAccommodationsView extends SectionView {
  standing: AccommodationView[];
  ended: AccommodationView[];
}

/** The modified rubrics of a section's sittings, and those for the term of the students who are in it today. */
export const listAccommodations = defineVerb({
  action: 'accommodation.list',
  input: sectionAccommodationsInput,
  async run({ actor, input, tx, authorize, found, logView }): Promise<SectionAccommodationsView> {
    const { sectionId } = input;
    const section = found(await selectSection(tx, actor.schoolId, sectionId));
    authorize(sectionSubject(section));
    const { departmentId } = section;
    const rows = await selectAccommodations(tx, actor.schoolId, { departmentId, sectionId });
    const views = rows.map(asAccommodationView);
    await logView({
      subjectKind: 'section',
      subjectId: sectionId,
      details: { modifiedRubrics: views.length },
    });
    return {
      ...asSectionView(section),
      standing: views.filter(({ ended }) => ended === null),
      ended: views.filter(({ ended }) => ended !== null),
    };
  },
});
