'use client';

import { flushSync } from 'react-dom';
import { Button } from '@/components/ui/button';
import { SelectField } from '@/components/ui/select-field';
import { type DraftCheck, freshId, type PracticalDraft } from '@/lib/practicals/draft';
import { DraftField } from './draft-field';
import { fieldId, useEditor } from './editor-context';

interface ChecksFieldsProps {
  /** Where the list stands in the draft, and how to find it in a copy. */
  base: string;
  checks: readonly DraftCheck[];
  listIn(draft: PracticalDraft): DraftCheck[] | null;
  emptyText: string;
}

/** Changes the list and goes on in the first of these fields that is there then. */
function changeAndGo(work: () => void, ...paths: string[]): void {
  flushSync(work);
  const field = paths.map((path) => document.getElementById(fieldId(path))).find((each) => each !== null);
  field?.focus();
}

const MOST = { checks: 20, levels: 10 };

/** Checks with their levels: what each level is called and what it loses. */
export function ChecksFields({ base, checks, listIn, emptyText }: ChecksFieldsProps) {
  const { desk } = useEditor();
  const change = (work: (list: DraftCheck[]) => void) =>
    desk.edit((draft) => {
      const list = listIn(draft);
      if (list) work(list);
    });
  return (
    <div className="@container">
      {checks.length === 0 ? <p className="text-ink-2">{emptyText}</p> : null}
      <ol className="grid gap-6">
        {checks.map((check, index) => (
          <li key={check.id} className="border-b border-hair pb-4">
            <CheckFields list={base} base={`${base}.${index}`} {...{ check, index, change }} />
          </li>
        ))}
      </ol>
      {checks.length < MOST.checks ? (
        <Button
          id={fieldId(`${base}.add`)}
          className="mt-4"
          onClick={() =>
            changeAndGo(
              () => change((list) => void list.push(newCheck(list))),
              `${base}.${checks.length}.label`,
            )
          }
        >
          add a check
        </Button>
      ) : null}
    </div>
  );
}

function newCheck(list: readonly DraftCheck[]): DraftCheck {
  return {
    id: freshId('check', list),
    label: '',
    levels: [
      { label: 'good', lose: '0' },
      { label: 'not good', lose: '1' },
    ],
    assume: 0,
  };
}

interface CheckFieldsProps {
  list: string;
  base: string;
  check: DraftCheck;
  index: number;
  change(work: (list: DraftCheck[]) => void): void;
}

function CheckFields({ list, base, check, index, change }: CheckFieldsProps) {
  const name = check.label || `check ${index + 1}`;
  const changeThis = (work: (check: DraftCheck) => void) =>
    change((all) => {
      const found = all[index];
      if (found) work(found);
    });
  return (
    <div className="grid gap-x-6 gap-y-3 @min-[44rem]:grid-cols-[15rem_minmax(0,1fr)_15rem]">
      <div>
        <DraftField path={`${base}.label`} label="what is checked" />
        <Button
          kind="quiet"
          size="small"
          className="px-0"
          aria-label={`take out ${name}`}
          onClick={() =>
            changeAndGo(
              () => change((all) => void all.splice(index, 1)),
              `${list}.${index}.label`,
              `${list}.${index - 1}.label`,
              `${list}.add`,
            )
          }
        >
          take out
        </Button>
      </div>
      <fieldset className="min-w-0">
        <legend className="sr-only">what {name} passes as, and its faults</legend>
        {[...check.levels.keys()].map((place) => (
          <div key={place} className="grid grid-cols-[minmax(0,1fr)_7rem_2.5rem] items-end gap-x-3">
            <DraftField path={`${base}.levels.${place}.label`} label={place === 0 ? 'passes as' : 'or is'} />
            {place === 0 ? (
              <p className="py-2 text-text text-ink-2">loses nothing</p>
            ) : (
              <DraftField path={`${base}.levels.${place}.lose`} label="loses" kind="number" />
            )}
            {place > 1 ? (
              <Button
                kind="quiet"
                size="small"
                className="px-0"
                aria-label={`take out fault ${place} of ${name}`}
                onClick={() =>
                  changeAndGo(
                    () =>
                      changeThis((each) => {
                        each.levels.splice(place, 1);
                        if (each.assume !== null && each.assume >= each.levels.length) each.assume = 0;
                      }),
                    `${base}.levels.${place}.label`,
                    `${base}.levels.${place - 1}.label`,
                  )
                }
              >
                out
              </Button>
            ) : null}
          </div>
        ))}
        {check.levels.length < MOST.levels ? (
          <Button
            kind="quiet"
            size="small"
            className="px-0"
            onClick={() =>
              changeAndGo(
                () => changeThis((each) => void each.levels.push({ label: '', lose: '' })),
                `${base}.levels.${check.levels.length}.label`,
              )
            }
          >
            add a fault
          </Button>
        ) : null}
      </fieldset>
      <SelectField
        label="when nobody says, it is taken as"
        value={check.assume === null ? '' : String(check.assume)}
        onChange={(event) => {
          const { value } = event.target;
          changeThis((each) => {
            each.assume = value === '' ? null : Number(value);
          });
        }}
        options={[
          ...check.levels.map(({ label }, place) => ({
            value: String(place),
            label: label || (place === 0 ? 'passed' : `fault ${place}`),
          })),
          { value: '', label: 'nothing until said' },
        ]}
      />
    </div>
  );
}
