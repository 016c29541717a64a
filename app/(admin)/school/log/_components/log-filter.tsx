import Form from 'next/form';
import { LinkButton } from '@/components/ui/link-button';
import { SelectField } from '@/components/ui/select-field';
import { SubmitButton } from '@/components/ui/submit-button';
import { TextField } from '@/components/ui/text-field';
import type { LogView } from '@/lib/data/school/read-log';
import { sayAction } from './action-words';

interface LogFilterProps {
  said: Record<string, string>;
  choices: LogView['choices'];
}

export function LogFilter({ said, choices }: LogFilterProps) {
  const isFiltered = Object.keys(said).some((name) => name !== 'page');
  return (
    <Form
      action="/school/log"
      key={JSON.stringify(said)}
      className="mb-4 grid grid-cols-2 items-end gap-x-4 gap-y-3 lg:grid-cols-[9.5rem_9.5rem_1fr_1fr_auto] print:hidden"
    >
      <TextField label="from" type="date" name="from" defaultValue={said.from} />
      <TextField label="to" type="date" name="to" defaultValue={said.to} />
      <SelectField
        label="what"
        name="action"
        placeholder="anything"
        options={choices.actions.map((action) => ({ value: action, label: sayAction(action) }))}
        defaultValue={said.action ?? ''}
      />
      <SelectField
        label="who"
        name="actorId"
        placeholder="anybody"
        options={choices.people.map(({ personId, name }) => ({ value: personId, label: name }))}
        defaultValue={said.actorId ?? ''}
      />
      {said.aboutPersonId ? <input type="hidden" name="aboutPersonId" value={said.aboutPersonId} /> : null}
      <div className="flex gap-2">
        <SubmitButton kind="plain">show</SubmitButton>
        {isFiltered ? (
          <LinkButton kind="quiet" href="/school/log">
            all
          </LinkButton>
        ) : null}
      </div>
    </Form>
  );
}
