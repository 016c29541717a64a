import { classNames } from '@/components/ui/class-names';
import { LengthText } from '@/components/ui/fraction';
import type { Unit } from '@/lib/length';
import { AXES } from '@/lib/scoring';
import type { CutList } from '@/lib/scoring/rubric-form';

interface SizesOfListProps {
  original: CutList;
  variant: CutList;
  unit: Unit;
}

/** The sizes of a list, part by part; those that the variant has moved stand out. */
export function SizesOfList({ original, variant, unit }: SizesOfListProps) {
  const before = new Map(original.lines.map(({ id, target }) => [id, target]));
  return (
    <ul className="grid grid-cols-[auto_1fr] gap-x-3">
      {variant.lines.map(({ id, label, target }) => (
        <li key={id} className="contents">
          <span className="text-ink-2">{label}</span>
          <span className="whitespace-nowrap">
            {AXES.map((axis, index) => {
              const was = before.get(id)?.[axis];
              const moved = was !== undefined && was !== target[axis];
              return (
                <span key={axis}>
                  {index > 0 ? <span aria-hidden="true"> × </span> : null}
                  {index > 0 ? <span className="sr-only"> by </span> : null}
                  <LengthText
                    ticks={target[axis]}
                    unit={unit}
                    className={classNames(moved ? 'font-[720]' : 'text-ink-2')}
                  />
                </span>
              );
            })}
          </span>
        </li>
      ))}
    </ul>
  );
}
