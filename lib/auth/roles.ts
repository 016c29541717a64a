export const ROLES = ['teacher', 'student', 'head', 'aide', 'admin'] as const;

export type Role = (typeof ROLES)[number];

export const ROLE_NAMES: Record<Role, string> = {
  teacher: 'teacher',
  student: 'student',
  head: 'department head',
  aide: 'aide',
  admin: 'admin',
};

/** Where a person lands who acts in this role. */
export const ROLE_HOME: Record<Role, string> = {
  teacher: '/periods',
  student: '/my',
  head: '/department',
  aide: '/round',
  admin: '/school',
};
