'use client';

import { type FieldMetadata, getFormProps, getInputProps, getSelectProps, useForm } from '@conform-to/react';
import { parseWithZod } from '@conform-to/zod/v4';
import Link from 'next/link';
import { useActionState } from 'react';
import { FormRefusal } from '@/components/account/form-refusal';
import { keepTyped } from '@/components/ui/keep-typed';
import { LinkButton } from '@/components/ui/link-button';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import { openSittingInput } from '@/lib/contracts/sittings';
import type { OpenChoicesView, VersionChoice } from '@/lib/data/sittings/read-open-choices';
import { count, sayPeriod } from '../../../_components/names';
import { openSittingAction } from '../../actions';
import { VariantChoice } from './variant-choice';

interface OpenFormProps {
  sections: OpenChoicesView['sections'];
  families: OpenChoicesView['families'];
  chosen: string | null;
  /** The practical that the person comes from. */
  practicalId: string | null;
}

/** Which period gets which version, by when. What a section has already is not offered to it. */
export function OpenForm({ sections, families, chosen, practicalId }: OpenFormProps) {
  const [lastResult, action] = useActionState(openSittingAction, undefined);
  const first =
    sections.find(({ sectionId }) => sectionId === chosen) ??
    (sections.length === 1 ? sections[0] : undefined);
  const [form, fields] = useForm({
    id: 'sitting',
    lastResult,
    defaultValue: {
      sectionId: first?.sectionId,
      versionId: firstVersion(first ? [first] : sections, practicalId),
    },
    onValidate: ({ formData }) => parseWithZod(formData, { schema: openSittingInput }),
  });
  const section = sections.find(({ sectionId }) => sectionId === fields.sectionId.value);
  const version = section?.versions.find(({ versionId }) => versionId === fields.versionId.value);
  const family = version && families.find(({ practicalIds }) => practicalIds.includes(version.practicalId));
  return (
    <form {...getFormProps(form)} action={action} onReset={keepTyped} className="grid max-w-[34rem] gap-4">
      <FormRefusal errors={form.errors} />
      <SelectField
        label="period"
        placeholder="choose a period"
        options={sections.map(({ sectionId, name, period, studentCount }) => ({
          value: sectionId,
          label: `${sayPeriod(period)}, ${name}, ${count(studentCount, 'student', 'students')}`,
        }))}
        {...getSelectProps(fields.sectionId)}
        key={fields.sectionId.key}
        error={fields.sectionId.errors}
      />
      <VersionChoices section={section} field={fields.versionId} />
      {section && family ? (
        <VariantChoice
          family={family}
          open={section.versions}
          versionId={fields.versionId.value}
          onChoose={(value) => form.update({ name: fields.versionId.name, value })}
        />
      ) : null}
      <TextField
        label="due"
        optional
        {...getInputProps(fields.dueOn, { type: 'date' })}
        key={fields.dueOn.key}
        error={fields.dueOn.errors}
        className="max-w-60"
      />
      <p className="max-w-[56ch] text-label text-ink-2">
        Everyone in the period gets an attempt, also those who join while the sitting is open.
      </p>
      <div className="mt-2 flex flex-wrap gap-2">
        <SubmitButton pendingLabel="opening it">open the sitting</SubmitButton>
        <LinkButton href="/sittings">leave it</LinkButton>
      </div>
    </form>
  );
}

/** The latest version of the practical that the person comes from; else the first of the only period. */
function firstVersion(sections: OpenFormProps['sections'], practicalId: string | null): string | undefined {
  const versions = sections.flatMap((section) => section.versions);
  if (practicalId) return versions.find((version) => version.practicalId === practicalId)?.versionId;
  return sections.length === 1 ? versions[0]?.versionId : undefined;
}

interface VersionChoicesProps {
  section: OpenFormProps['sections'][number] | undefined;
  field: FieldMetadata<string>;
}

function VersionChoices({ section, field }: VersionChoicesProps) {
  return (
    <>
      <SelectField
        label="practical"
        hint="The latest version of each stands first. The sitting keeps the one you choose."
        placeholder={section ? 'choose a practical' : 'choose a period first'}
        options={(section?.versions ?? []).map((version) => ({
          value: version.versionId,
          label: sayVersion(version),
        }))}
        {...getSelectProps(field)}
        key={`${field.key}-${section?.sectionId}`}
        error={field.errors}
      />
      {section && section.versions.length === 0 ? (
        <p className="text-label">
          This period has every published practical of its department already.{' '}
          <Link className="link" href="/practicals">
            Publish another one
          </Link>{' '}
          first.
        </p>
      ) : null}
    </>
  );
}

function sayVersion({ title, number, latest, approved, ownerName }: VersionChoice): string {
  const parts = [title, `version ${number}`];
  if (!latest) parts.push('an older one');
  if (ownerName) parts.push(`by ${ownerName}`);
  if (approved) parts.push('the department’s');
  return parts.join(', ');
}
