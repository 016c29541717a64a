'use client';

import { classNames } from '@/components/ui/class-names';
import { pointsAsText } from '@/components/ui/points-text';
import { findPiece } from '@/lib/round/pieces';
import { recordOf, valueAt } from '@/lib/round/record';
import { useBench } from './bench-context';
import { Choice } from './choice-panel';

/** The levels of each check of a piece, or of the whole work, as keys; pressing one records it. */
export function CheckChoice({ at }: { at: { lineId: string; ordinal: number } | null }) {
  const { view, press } = useBench();
  const { state } = view;
  const { rubric } = state.plan;
  const place = at && findPiece(rubric, at);
  const checks = at ? (place?.line.checks ?? []) : rubric.workChecks;
  const record = recordOf(state);
  return (
    <Choice title={at ? `How is ${place?.label}?` : 'How is the whole work?'} back="back to sizes">
      {checks.map((check) => {
        const value = valueAt(record, {
          lineId: at?.lineId ?? '',
          ordinal: at?.ordinal ?? 0,
          what: check.id,
        });
        const level = value !== null && value !== 'conflict' && value.kind === 'level' ? value.level : null;
        return (
          <fieldset key={check.id} className="min-w-0">
            <legend className="mb-1 text-lead font-[620]">
              {check.label}
              <span className="font-[440] text-ink-2">
                {value === 'conflict'
                  ? ', two readings'
                  : level === null && check.assume !== null
                    ? ', assumed'
                    : ''}
              </span>
            </legend>
            <div className="flex flex-wrap">
              {check.levels.map((each, index) => (
                <button
                  key={each.label}
                  type="button"
                  aria-pressed={level === index}
                  onClick={() => press({ do: 'check', checkId: check.id, level: index })}
                  className={classNames(
                    'min-h-touch min-w-24 border-outline border-ink px-3 text-left select-none not-first:-ml-[1.75px] active:bg-ink active:text-sheet',
                    level === index ? 'bg-ink text-sheet' : 'bg-plate',
                    level === null && check.assume === index && 'border-dashed',
                  )}
                >
                  <span className="narrow block text-[22px] leading-6 font-[660]">{each.label}</span>
                  <span className="text-label">loses {pointsAsText(each.lose)}</span>
                </button>
              ))}
            </div>
          </fieldset>
        );
      })}
    </Choice>
  );
}
