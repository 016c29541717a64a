import type { SittingRow } from '@/db/queries/sittings';
import type { Subject } from '@/lib/auth/policy';

/** The sitting as the policy asks for it. */
export function sittingSubject({ schoolId, departmentId, teacherIds }: SittingRow): Subject {
  return { schoolId, departmentId, teacherIds };
}
