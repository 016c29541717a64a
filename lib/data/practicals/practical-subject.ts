import 'server-only';
import type { Subject } from '@/lib/auth/policy';

/** What permission to a practical depends on: its school, department and owner. */
export function practicalSubject(row: { schoolId: string; departmentId: string; ownerId: string }): Subject {
  return { schoolId: row.schoolId, departmentId: row.departmentId, teacherIds: [row.ownerId] };
}
