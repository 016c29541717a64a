import 'server-only';
import type { Subject } from '@/lib/auth/policy';

interface PracticalOwnership {
  schoolId: string;
  departmentId: string;
  ownerId: string;
  offeredAt: Date | null;
}

/** What permission to a practical depends on: its school, department and owner, and whether it is on offer. */
export function practicalSubject({
  schoolId,
  departmentId,
  ownerId,
  offeredAt,
}: PracticalOwnership): Subject {
  return { schoolId, departmentId, teacherIds: [ownerId], offered: offeredAt !== null };
}
