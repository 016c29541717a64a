'use client';

import { Button } from '@/components/ui/button';
import { Segmented } from '@/components/ui/segmented';
import { parseLength } from '@/lib/length';
import { lengthAsTyped, pointsAsTyped } from '@/lib/practicals/as-typed';
import type { DraftSide } from '@/lib/practicals/draft';
import { readPoints } from '@/lib/practicals/field-reader';
import type { Axis } from '@/lib/scoring';
import { BandField } from './band-field';
import { useEditor } from './editor-context';
import type { SizeRuleDesk } from './use-size-rule';

const MOST_BANDS = 20;

interface BandFieldsProps {
  size: SizeRuleDesk;
  axis: Axis;
  off: [under: string, over: string];
}

/** The bands as typed: how far each reaches and what it costs. */
export function BandFields({ size, axis, off: [under, over] }: BandFieldsProps) {
  const { rule } = size;
  return (
    <div className="mt-4">
      <div className="grid gap-x-12 gap-y-6 md:grid-cols-[repeat(2,minmax(0,1fr))] lg:grid-cols-[repeat(2,minmax(0,21rem))_15rem]">
        {rule.mirrored ? (
          <SideFields side="over" title={`over and under: ${over} and ${under}`} {...{ size, axis }} />
        ) : (
          <>
            <SideFields side="under" title={`under: ${under}`} {...{ size, axis }} />
            <SideFields side="over" title={`over: ${over}`} {...{ size, axis }} />
          </>
        )}
        <div>
          <Segmented
            label="sides"
            showLabel
            options={[
              { value: 'alike', label: 'both sides alike' },
              { value: 'apart', label: 'each side by itself' },
            ]}
            value={rule.mirrored ? 'alike' : 'apart'}
            onChange={(value) => size.change((each) => Object.assign(each, { mirrored: value === 'alike' }))}
          />
          <div className="mt-4 max-w-56">
            <BandField
              size={size}
              suffix="cap"
              label="most that this size loses, in points"
              showLabel
              placeholder="no limit"
            />
          </div>
        </div>
      </div>
    </div>
  );
}

interface SideFieldsProps {
  size: SizeRuleDesk;
  side: 'over' | 'under';
  title: string;
  axis: Axis;
}

function SideFields({ size, side, title, axis }: SideFieldsProps) {
  const { unit } = useEditor();
  const { bands } = size.rule[side];
  const last = bands.length - 1;
  const name = `${side}, ${axis}`;
  return (
    <fieldset className="min-w-0">
      <legend className="text-label font-[640]">{title}</legend>
      <div className="mt-1 grid grid-cols-[minmax(0,1fr)_minmax(0,1fr)_2.5rem] items-start gap-x-4 gap-y-1">
        <span className="text-label text-ink-2">within</span>
        <span className="text-label text-ink-2">loses</span>
        <span />
        {[...bands.keys()].map((index) => (
          <BandRow key={index} {...{ size, side, index, name }} />
        ))}
        <span className="pt-2 text-label">past the last band</span>
        <BandField size={size} suffix={`${side}.beyond`} label={`${name}, past the last band, points`} />
      </div>
      {bands.length < MOST_BANDS ? (
        <Button
          kind="quiet"
          size="small"
          className="px-0"
          onClick={() => size.change((rule) => void rule[side].bands.push(nextBand(rule[side], unit)))}
        >
          add a band past {bands[last]?.within || 'the last'}
        </Button>
      ) : null}
    </fieldset>
  );
}

interface BandRowProps {
  size: SizeRuleDesk;
  side: 'over' | 'under';
  index: number;
  name: string;
}

function BandRow({ size, side, index, name }: BandRowProps) {
  const at = `${side}.bands.${index}`;
  const band = `${name}, band ${index + 1}`;
  return (
    <>
      <BandField size={size} suffix={`${at}.within`} label={`${band}, within`} isLength />
      {index === 0 ? (
        <span className="px-1 pt-2 text-text text-ink-2">nothing</span>
      ) : (
        <BandField size={size} suffix={`${at}.lose`} label={`${band}, points`} />
      )}
      {index === 0 ? (
        <span />
      ) : (
        <Button
          kind="quiet"
          size="small"
          className="min-h-9 px-1"
          aria-label={`take out ${band}`}
          onClick={() => size.change((rule) => void rule[side].bands.splice(index, 1))}
        >
          out
        </Button>
      )}
    </>
  );
}

/** One step further out than the last band, at the price of what lies past it. */
function nextBand(side: DraftSide, unit: 'in' | 'mm'): DraftSide['bands'][number] {
  const [before, last] = side.bands.slice(-2).map(({ within }) => parseLength(within, unit));
  const end = last ?? before;
  if (!end?.ok) return { within: '', lose: side.beyond };
  const step = last?.ok && before?.ok ? last.ticks - before.ticks : end.ticks;
  const lose = readPoints(side.beyond);
  return {
    within: step > 0 ? lengthAsTyped(end.ticks + step, unit) : '',
    lose: lose === null ? side.beyond : pointsAsTyped(lose),
  };
}
