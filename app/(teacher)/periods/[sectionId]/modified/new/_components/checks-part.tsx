'use client';

import { pointsAsText } from '@/components/ui/points-text';
import { Segmented } from '@/components/ui/segmented';
import { TextField } from '@/components/ui/text-field';
import { Heading } from '@/components/ui/titles';
import type { CheckRow } from './check-rows';
import type { Typed } from './use-typed';

type TypedCheck = Typed['typed']['checks'][number];
type Errors = Record<string, string[] | null>;

const WAYS: { value: TypedCheck['as']; label: string }[] = [
  { value: 'rubric', label: 'as all' },
  { value: 'not held', label: 'excused' },
  { value: 'priced', label: 'other price' },
];

export function ChecksPart({ typed, errors }: { typed: Typed; errors: Errors }) {
  return (
    <section>
      <Heading className="mb-2">Checks</Heading>
      {errors.checks?.map((text) => (
        <p key={text} role="alert" className="mb-1 text-label font-[580] text-refuse">
          {text}
        </p>
      ))}
      <ul className="border-t-outline border-ink">
        {typed.rows.map((row, index) => {
          const check = typed.typed.checks[index];
          return check ? (
            <CheckLine key={row.label} {...{ row, check, index, errors }} onChange={typed.setCheck} />
          ) : null;
        })}
      </ul>
    </section>
  );
}

interface CheckLineProps {
  row: CheckRow;
  check: TypedCheck;
  index: number;
  errors: Errors;
  onChange: (check: TypedCheck) => void;
}

function CheckLine({ row, check, index, errors, onChange }: CheckLineProps) {
  const name = `checks[${index}]`;
  const asWay = (value: string) => WAYS.find((way) => way.value === value)?.value ?? 'rubric';
  return (
    <li className="grid items-start gap-x-6 gap-y-3 border-b border-hair py-3 lg:grid-cols-[14rem_auto_1fr]">
      <input type="hidden" name={`${name}.label`} value={check.label} />
      <p className="lg:pt-2">
        <span className="font-[520]">{row.label}</span>
        <span className="block text-label text-ink-2">
          {row.of === 'work' ? 'the work' : 'each piece'}, {sayPrices(row)}
        </span>
      </p>
      <Segmented
        label={row.label}
        name={`${name}.as`}
        options={WAYS}
        value={check.as}
        onChange={(as) => onChange({ ...check, as: asWay(as) })}
      />
      {check.as === 'priced' ? (
        <div className="flex flex-wrap gap-3">
          {check.lose.map((price, at) => (
            <TextField
              key={row.levels[at + 1]?.label ?? at}
              label={`${row.levels[at + 1]?.label ?? 'this'} loses`}
              name={`${name}.lose[${at}]`}
              value={price}
              className="w-36"
              autoComplete="off"
              inputMode="decimal"
              onChange={(event) =>
                onChange({
                  ...check,
                  lose: check.lose.map((each, i) => (i === at ? event.target.value : each)),
                })
              }
              error={errors[`${name}.lose[${at}]`]}
            />
          ))}
        </div>
      ) : null}
    </li>
  );
}

function sayPrices({ levels }: CheckRow): string {
  const prices = levels.slice(1).map(({ lose }) => pointsAsText(lose));
  return `loses ${prices.length > 1 ? `${prices.slice(0, -1).join(', ')} or ${prices.at(-1)}` : prices[0]}`;
}
