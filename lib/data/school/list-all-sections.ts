import 'server-only';
import { z } from 'zod';
import { selectSectionsOverview } from '@/db/queries/school';
import { defineVerb } from '../verb';

export interface SectionOverviewView {
  sectionId: string;
  name: string;
  period: string;
  termName: string;
  departmentName: string;
  teachers: string[];
  studentCount: number;
  sittingCount: number;
}

/** Every section of the school that is in use, as its admin sees them. */
export const listAllSections = defineVerb({
  action: 'school.read',
  input: z.object({}),
  async run({ actor, tx, authorize }): Promise<SectionOverviewView[]> {
    authorize({ schoolId: actor.schoolId });
    return selectSectionsOverview(tx, actor.schoolId);
  },
});
