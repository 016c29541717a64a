'use client';

import { Button } from '@/components/ui/button';
import { ButtonRow } from '@/components/ui/button-row';
import { SelectField } from '@/components/ui/select-field';
import { Heading } from '@/components/ui/titles';
import type { DraftLine } from '@/lib/practicals/draft';
import { lineOf, useEditor } from './editor-context';
import type { SheetDesk } from './sheet-desk';

const YES_NO = { '': null, yes: true, no: false } as const;
const SET = { '': null, each: 'each', worst: 'worst' } as const;

function isKey<Keys extends object>(keys: Keys, key: string): key is Extract<keyof Keys, string> {
  return Object.hasOwn(keys, key);
}

/** One line by itself: how its pieces are read, and its place in the list. */
export function LineDetail({ lineId, sheet }: { lineId: string; sheet: SheetDesk }) {
  const { desk } = useEditor();
  const found = lineOf(desk.draft.lines, lineId);
  if (!found) return null;
  const { line, index } = found;
  const name = line.label || `line ${index + 1}`;
  const { all } = desk.draft;
  const change = (work: (line: DraftLine) => void) =>
    desk.edit((next) => {
      const same = lineOf(next.lines, lineId)?.line;
      if (same) work(same);
    });
  return (
    <section aria-labelledby="line-heading" className="mt-8">
      <div className="mb-3 flex flex-wrap items-center gap-x-4 gap-y-2">
        <Heading id="line-heading" className="text-[1.4375rem] leading-7 font-[660] first-letter:uppercase">
          {name}, how its pieces are read
        </Heading>
        <ButtonRow className="lg:ml-auto">
          <Button
            size="small"
            notYet={index === 0 ? 'it is the first line' : null}
            onClick={() => sheet.move(index, index - 1, null)}
          >
            move up
          </Button>
          <Button
            size="small"
            notYet={index === desk.draft.lines.length - 1 ? 'it is the last line' : null}
            onClick={() => sheet.move(index, index + 1, null)}
          >
            move down
          </Button>
          <Button size="small" kind="refuse" onClick={() => sheet.remove(index)}>
            remove this line
          </Button>
        </ButtonRow>
      </div>
      <div className="grid max-w-[54rem] items-start gap-x-12 gap-y-4 md:grid-cols-2">
        <SelectField
          label="thickness and width"
          value={line.swap === null ? '' : line.swap ? 'yes' : 'no'}
          onChange={({ target: { value } }) => {
            if (isKey(YES_NO, value)) change((each) => Object.assign(each, { swap: YES_NO[value] }));
          }}
          options={[
            {
              value: '',
              label: `as all lines: ${all.swap ? 'may be read either way round' : 'each as it is'}`,
            },
            { value: 'yes', label: 'may be read either way round' },
            { value: 'no', label: 'each as it is' },
          ]}
        />
        <SelectField
          label="pieces of this line"
          value={line.set ?? ''}
          onChange={({ target: { value } }) => {
            if (isKey(SET, value)) change((each) => Object.assign(each, { set: SET[value] }));
          }}
          options={[
            {
              value: '',
              label: `as all lines: ${all.set === 'each' ? 'each by itself' : 'all as the worst'}`,
            },
            { value: 'each', label: 'each by itself' },
            { value: 'worst', label: 'all as the worst of them' },
          ]}
        />
      </div>
    </section>
  );
}
