import type { SectionRow } from '@/db/queries/sections';
import type { Subject } from '@/lib/auth/policy';

export interface SectionView {
  sectionId: string;
  name: string;
  period: string;
  termName: string;
  studentCount: number;
}

export function asSectionView(row: SectionRow): SectionView {
  const { sectionId, name, period, termName, studentCount } = row;
  return { sectionId, name, period, termName, studentCount };
}

/** The section, or a sitting of it, as the policy asks for it. */
export function sectionSubject({
  schoolId,
  departmentId,
  teacherIds,
}: Pick<SectionRow, 'schoolId' | 'departmentId' | 'teacherIds'>): Subject {
  return { schoolId, departmentId, teacherIds };
}
