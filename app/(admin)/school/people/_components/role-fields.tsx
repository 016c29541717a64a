'use client';

import { useState } from 'react';
import { CheckboxField, ChoiceGroup } from '@/components/ui/choice';
import { SelectField } from '@/components/ui/select-field';
import { ROLE_NAMES } from '@/lib/auth/roles';
import { STAFF_ROLES } from '@/lib/contracts/school';

const WHAT: Record<(typeof STAFF_ROLES)[number], string> = {
  teacher: 'writes practicals, measures and publishes for their own sections',
  head: 'compares the sections of a department',
  aide: 'records at the bench for the sections and days a teacher gives',
  admin: 'people, terms, departments, the access log',
};

interface RoleFieldsProps {
  roles: readonly string[];
  departmentId: string;
  departments: readonly { departmentId: string; name: string }[];
  errors: { roles?: string[]; departmentId?: string[] };
}

/** Which staff roles a person holds, and in which department. What is ticked stays ticked when the form comes back. */
export function RoleFields({ roles, departmentId, departments, errors }: RoleFieldsProps) {
  const [ticked, setTicked] = useState(new Set(roles));
  const [place, setPlace] = useState(departmentId);
  const toggle = (role: string, on: boolean) =>
    setTicked(new Set(on ? [...ticked, role] : [...ticked].filter((each) => each !== role)));
  const needsPlace = ticked.has('teacher') || ticked.has('head');
  return (
    <>
      <ChoiceGroup legend="may act as" error={errors.roles?.join(' ')}>
        {STAFF_ROLES.map((role) => (
          <CheckboxField
            key={role}
            name="roles"
            value={role}
            label={ROLE_NAMES[role]}
            hint={WHAT[role]}
            checked={ticked.has(role)}
            onChange={(event) => toggle(role, event.target.checked)}
          />
        ))}
      </ChoiceGroup>
      <SelectField
        label="department"
        name="departmentId"
        optional={!needsPlace}
        placeholder={needsPlace ? 'choose one' : 'none'}
        options={departments.map((each) => ({ value: each.departmentId, label: each.name }))}
        value={place}
        onChange={(event) => setPlace(event.target.value)}
        error={errors.departmentId}
      />
    </>
  );
}
