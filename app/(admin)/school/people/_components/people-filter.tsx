import Form from 'next/form';
import { Segmented } from '@/components/ui/segmented';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';

const SHOWN = [
  { value: 'staff', label: 'staff' },
  { value: 'students', label: 'students' },
  { value: 'left', label: 'left' },
];

export function PeopleFilter({ shown, search }: { shown: string; search: string }) {
  return (
    <Form
      action="/school/people"
      key={`${shown} ${search}`}
      className="mb-4 flex flex-wrap items-end gap-x-4 gap-y-3 print:hidden"
    >
      <Segmented label="who" name="shown" options={SHOWN} defaultValue={shown} />
      <TextField
        label="name, email or ID"
        name="search"
        defaultValue={search}
        maxLength={80}
        className="flex-1 basis-48 md:max-w-80"
      />
      <SubmitButton kind="plain">show</SubmitButton>
    </Form>
  );
}
