'use client';

import { getInputProps, getSelectProps } from '@conform-to/react';
import { useState, useSyncExternalStore } from 'react';
import { Segmented } from '@/components/ui/segmented';
import { SelectField } from '@/components/ui/select-field';
import { TextField } from '@/components/ui/text-field';
import { Heading } from '@/components/ui/titles';
import { proposeSchoolCode } from '@/lib/contracts/school';
import type { SetUpFields } from './set-up-fields';

const noChange = () => () => {};

/** The device's own time zone, once the page runs in a browser. */
function useDeviceZone(zones: readonly string[]): string {
  const zone = useSyncExternalStore(
    noChange,
    () => Intl.DateTimeFormat().resolvedOptions().timeZone,
    () => '',
  );
  return zones.includes(zone) ? zone : '';
}

export function SchoolFields({ fields, zones }: { fields: SetUpFields; zones: readonly string[] }) {
  const [name, setName] = useState('');
  const [code, setCode] = useState<string | null>(null);
  const [chosenZone, setChosenZone] = useState<string | null>(null);
  const [unit, setUnit] = useState('in');
  const deviceZone = useDeviceZone(zones);
  return (
    <section className="grid gap-4">
      <Heading className="border-b border-ink pb-1">the school</Heading>
      <TextField
        label="name"
        {...getInputProps(fields.schoolName, { type: 'text', value: false })}
        key={fields.schoolName.key}
        value={name}
        onChange={(event) => setName(event.target.value)}
        autoComplete="organization"
        error={fields.schoolName.errors}
      />
      <TextField
        label="code"
        hint="Students type it to sign in: short, without spaces."
        {...getInputProps(fields.schoolCode, { type: 'text', value: false })}
        key={fields.schoolCode.key}
        value={code ?? proposeSchoolCode(name)}
        onChange={(event) => setCode(event.target.value)}
        autoCapitalize="none"
        autoComplete="off"
        spellCheck={false}
        error={fields.schoolCode.errors}
      />
      <SelectField
        label="time zone"
        placeholder="choose one"
        options={zones.map((zone) => ({ value: zone, label: zone.replaceAll('_', ' ') }))}
        {...getSelectProps(fields.timeZone, { value: false })}
        key={fields.timeZone.key}
        value={chosenZone ?? deviceZone}
        onChange={(event) => setChosenZone(event.target.value)}
        error={fields.timeZone.errors}
      />
      <Segmented
        label="lengths in"
        showLabel
        name={fields.unit.name}
        value={unit}
        onChange={setUnit}
        options={[
          { value: 'in', label: 'inches' },
          { value: 'mm', label: 'millimetres' },
        ]}
      />
    </section>
  );
}
