'use client';

import { getInputProps } from '@conform-to/react';
import { PasswordField } from '@/components/account/password-field';
import { CheckboxField, ChoiceGroup } from '@/components/ui/choice';
import { TextField } from '@/components/ui/text-field';
import { Heading } from '@/components/ui/titles';
import type { SetUpFields } from './set-up-fields';

export function YourFields({ fields }: { fields: SetUpFields }) {
  return (
    <section className="grid gap-4">
      <Heading className="border-b border-ink pb-1">you, the admin</Heading>
      <div className="grid grid-cols-2 gap-4">
        <TextField
          label="given name"
          {...getInputProps(fields.givenName, { type: 'text' })}
          key={fields.givenName.key}
          autoComplete="given-name"
          error={fields.givenName.errors}
        />
        <TextField
          label="family name"
          {...getInputProps(fields.familyName, { type: 'text' })}
          key={fields.familyName.key}
          autoComplete="family-name"
          error={fields.familyName.errors}
        />
      </div>
      <TextField
        label="email"
        {...getInputProps(fields.email, { type: 'email' })}
        key={fields.email.key}
        autoComplete="username"
        error={fields.email.errors}
      />
      <PasswordField
        label="password"
        name={fields.password.name}
        id={fields.password.id}
        autoComplete="new-password"
        hint="15 characters or more. A short sentence of your own is easiest to keep in mind."
        error={fields.password.errors}
      />
      <ChoiceGroup legend="besides">
        <CheckboxField
          label="I teach"
          {...getInputProps(fields.teaches, { type: 'checkbox' })}
          key={fields.teaches.key}
        />
        <CheckboxField
          label="I lead the department"
          {...getInputProps(fields.leads, { type: 'checkbox' })}
          key={fields.leads.key}
        />
      </ChoiceGroup>
    </section>
  );
}
