'use client';

import { PriceStair } from '@/components/rule/price-stair';
import { classNames } from '@/components/ui/class-names';
import type { DraftSizeRule } from '@/lib/practicals/draft';
import { readSizeRule } from '@/lib/practicals/parse-size-rule';
import type { Axis } from '@/lib/scoring';
import { lineOf, useEditor } from './editor-context';
import { marginOf, targetOf } from './read-draft';

interface PriceCellProps {
  lineId: string | null;
  axis: Axis;
  rule: DraftSizeRule | null;
  path: string;
  dearest: number;
}

/** The price of one size in small; pressing it lays it out below. */
export function PriceCell({ lineId, axis, rule, path, dearest }: PriceCellProps) {
  const { desk, unit, selection, select, findings } = useEditor();
  const read = rule ? readSizeRule(rule, unit) : null;
  const selected = selection.kind === 'size' && selection.lineId === lineId && selection.axis === axis;
  const refused = rule !== null && read === null;
  const found = rule !== null && findings.some((each) => each.path === path && !each.isNote);
  const name = lineOf(desk.draft.lines, lineId)?.line.label || (lineId === null ? 'all lines' : 'line');
  const state = rule === null ? 'as all lines' : refused ? 'cannot be read yet' : 'its own';
  return (
    <button
      type="button"
      aria-pressed={selected}
      aria-label={`price of ${axis}, ${name}: ${state}${found ? ', with a finding' : ''}`}
      onClick={() => select({ kind: 'size', lineId, axis })}
      className={classNames(
        'relative flex min-h-10 w-full items-center border-edge border-transparent text-label text-ink-2 hover:border-hair',
        selected && 'border-act bg-plate hover:border-act',
        refused && 'text-refuse',
      )}
    >
      {rule === null ? (
        'as all'
      ) : read ? (
        <PriceStair
          unit={unit}
          target={targetOf(desk.draft, lineId, axis)}
          rule={read}
          margin={marginOf(desk.draft)}
          dearestPoints={dearest}
          className="block h-auto w-full max-w-[72px]"
        />
      ) : (
        'not read yet'
      )}
      {found ? (
        <span aria-hidden className="absolute right-0 bottom-0 size-[7px] rounded-[50%] bg-ink" />
      ) : null}
    </button>
  );
}
