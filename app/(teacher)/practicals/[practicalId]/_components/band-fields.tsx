'use client';

import { Segmented } from '@/components/ui/segmented';
import type { Axis, SizeRule } from '@/lib/scoring';
import { BandField } from './band-field';
import { BandRows } from './band-rows';
import type { SizeRuleDesk } from './use-size-rule';

interface BandFieldsProps {
  size: SizeRuleDesk;
  axis: Axis;
  off: [under: string, over: string];
  /** The price as it can be read now; null while it cannot. */
  read: SizeRule | null;
}

/** The bands as typed: how far each reaches, what it costs, and how well an instrument tells it from the next. */
export function BandFields({ size, axis, off: [under, over], read }: BandFieldsProps) {
  const { rule } = size;
  const shared = { size, axis, read };
  return (
    <div className="min-w-0">
      {size.isOwn ? (
        <div className="mb-4 flex flex-wrap items-end gap-x-4 gap-y-3">
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
          <div className="w-40">
            <BandField
              size={size}
              suffix="cap"
              label="most this size loses"
              showLabel
              placeholder="no limit"
            />
          </div>
        </div>
      ) : null}
      <div className="grid grid-cols-[minmax(0,1fr)] gap-y-6">
        {rule.mirrored ? (
          <BandRows side="over" title={`over and under: ${over} and ${under}`} {...shared} />
        ) : (
          <>
            <BandRows side="under" title={`under: ${under}`} {...shared} />
            <BandRows side="over" title={`over: ${over}`} {...shared} />
          </>
        )}
      </div>
    </div>
  );
}
