'use client';

import { Button } from '@/components/ui/button';
import { CheckboxField } from '@/components/ui/choice';
import { LengthText } from '@/components/ui/fraction';
import { Heading } from '@/components/ui/titles';
import { readSizeRule } from '@/lib/practicals/parse-size-rule';
import type { Axis } from '@/lib/scoring';
import { BandFields } from './band-fields';
import { lineOf, useEditor } from './editor-context';
import { PresetKeys } from './preset-keys';
import { OFF, PriceOnRule } from './price-on-rule';
import { readSize, targetOf } from './read-draft';
import { FindingText } from './row-notes';
import { type SizeRuleDesk, useSizeRule } from './use-size-rule';

/** The price of one size on its rule: what is typed below stands on it at once. */
export function SizeEditor({ lineId, axis }: { lineId: string | null; axis: Axis }) {
  const { desk, unit, findings } = useEditor();
  const size = useSizeRule(lineId, axis);
  const found = lineOf(desk.draft.lines, lineId);
  const target = targetOf(desk.draft, lineId, axis);
  const name = found ? found.line.label || `line ${found.index + 1}` : 'all lines';
  const ofLine = found ? readSize(found.line[axis], unit) : null;
  const read = readSizeRule(size.rule, unit);
  const here = findings.filter(({ path }) => path === size.base);
  return (
    <section aria-labelledby="size-heading" className="mt-8">
      <div className="mb-3 flex flex-wrap items-center gap-x-4 gap-y-2">
        <Heading id="size-heading" className="text-[1.4375rem] leading-7 font-[660] first-letter:uppercase">
          {name}, {size.together ? 'every size' : axis}{' '}
          {ofLine === null ? null : <LengthText ticks={ofLine} unit={unit} />}
        </Heading>
        {lineId === null ? (
          <CheckboxField
            label="thickness, width and length alike"
            className="text-label"
            checked={size.together}
            onChange={(event) => size.setTogether(event.target.checked)}
          />
        ) : (
          <Owner size={size} />
        )}
        {size.isOwn ? <PresetKeys size={size} read={read} /> : null}
      </div>
      {read ? (
        <PriceOnRule rule={read} name={`${name}, ${axis}`} {...{ size, axis, target }} />
      ) : (
        <p className="border-y border-hair py-6 text-ink-2">
          The rule is drawn again as soon as every band below can be read.
        </p>
      )}
      {here.length > 0 ? (
        <div className={here.every(({ isNote }) => isNote) ? 'mt-3' : 'mt-3 border-t-edge border-ink pt-2'}>
          {here.map((finding) => (
            <FindingText key={finding.code} {...finding} />
          ))}
        </div>
      ) : null}
      {size.isOwn ? <BandFields size={size} axis={axis} off={OFF[axis]} /> : null}
    </section>
  );
}

function Owner({ size }: { size: SizeRuleDesk }) {
  return size.isOwn ? (
    <p className="text-label text-ink-2">
      differs from all lines{' '}
      <Button kind="quiet" size="small" className="px-2" onClick={size.makeAsAll}>
        price as all lines
      </Button>
    </p>
  ) : (
    <p className="text-label text-ink-2">
      priced as all lines{' '}
      <Button kind="quiet" size="small" className="px-2" onClick={size.makeOwn}>
        price it by itself
      </Button>
    </p>
  );
}
