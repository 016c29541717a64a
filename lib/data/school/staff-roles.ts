import type { Transaction } from '@/db/client';
import { selectDepartment } from '@/db/queries/departments';
import type { Role } from '@/lib/auth/roles';

/** Role rows as they are kept: an admin belongs to no department. */
export function roleRows(roles: readonly Role[], departmentId: string | null | undefined) {
  return [...new Set(roles)].map((role) => ({
    role,
    departmentId: role === 'admin' ? null : (departmentId ?? null),
  }));
}

export async function isOwnDepartment(
  tx: Transaction,
  schoolId: string,
  departmentId: string | null | undefined,
): Promise<boolean> {
  return !departmentId || (await selectDepartment(tx, schoolId, departmentId)) !== undefined;
}

export const NO_SUCH_DEPARTMENT = { departmentId: ['Choose a department from the list.'] };
