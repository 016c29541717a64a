'use client';

import { classNames } from '@/components/ui/class-names';
import { pointsAsText } from '@/components/ui/points-text';
import type { PiecePlace } from '@/lib/round/pieces';
import { type BenchRecord, valueAt } from '@/lib/round/record';
import { useBench } from './bench-context';

interface ChecksCellProps {
  place: PiecePlace;
  record: BenchRecord;
  present: boolean;
  startsLine: boolean;
}

/** The piece's checks in one word; a tap opens their levels as keys. */
export function ChecksCell({ place, record, present, startsLine }: ChecksCellProps) {
  const { view, press } = useBench();
  const { line, ordinal, label } = place;
  const frame = classNames(
    'flex h-12 w-full border-r border-b border-rule',
    startsLine && 'border-l-outline border-l-ink',
  );
  if (!present || line.checks.length === 0) return <div className={frame} />;
  const { asked } = view.state;
  const open = asked?.about === 'checks' && asked.lineId === line.id && asked.ordinal === ordinal;
  const { word, sure } = wordOf(place, record);
  return (
    <div className={frame}>
      <button
        type="button"
        onClick={() => press({ do: 'point', lineId: line.id, ordinal, what: 'checks' })}
        aria-expanded={open}
        aria-label={`${label}, checks: ${word}`}
        data-cell={`${line.id}/${ordinal}/checks`}
        className={classNames(
          'narrow w-full overflow-hidden px-1 text-text leading-4 select-none active:bg-ink active:text-sheet focus-visible:relative focus-visible:z-10',
          open ? 'bg-act-wash font-[680] text-act' : sure ? 'font-[660]' : 'text-ink-2',
        )}
      >
        {word}
      </button>
    </div>
  );
}

function wordOf({ line, ordinal }: PiecePlace, record: BenchRecord): { word: string; sure: boolean } {
  const levels = line.checks.map((check) => ({
    check,
    value: valueAt(record, { lineId: line.id, ordinal, what: check.id }),
  }));
  if (levels.some(({ value }) => value === 'conflict')) return { word: 'two readings', sure: true };
  const lost = levels.flatMap(({ check, value }) => {
    if (value === null || value === 'conflict' || value.kind !== 'level' || value.level === 0) return [];
    return [{ check, lose: check.levels[value.level]?.lose ?? 0 }];
  });
  const [first] = lost;
  if (first) {
    const sum = lost.reduce((total, { lose }) => total + lose, 0);
    return { word: `${lost.length > 1 ? lost.length : first.check.label} −${pointsAsText(sum)}`, sure: true };
  }
  const unset = levels.filter(({ value }) => value === null);
  if (unset.length === 0) return { word: 'good', sure: true };
  return unset.some(({ check }) => check.assume === null)
    ? { word: 'to see', sure: true }
    : { word: 'assumed', sure: false };
}
