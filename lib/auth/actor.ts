import type { Role } from './roles';

/** Who asks, in the role they have chosen to act in. */
export interface Actor {
  personId: string;
  schoolId: string;
  role: Role;
  /** Every role the person holds; the session acts in one of them. */
  roles: Role[];
  /** The department that a head leads, or that a teacher teaches in. */
  departmentId: string | null;
  givenName: string;
  familyName: string;
  schoolName: string;
  /** A passphrase or password that was handed out must be changed before anything else. */
  mustChangePassword: boolean;
}
