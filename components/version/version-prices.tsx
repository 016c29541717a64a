import { FittedRuleFace } from '@/components/rule/fitted-rule-face';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import { distinctPrices } from '@/lib/practicals/distinct-prices';
import { faceScale } from '@/lib/practicals/face-scale';
import type { Rubric } from '@/lib/scoring';

/** Each price of error once, on the rule face of the first size that has it. */
export function VersionPrices({ rubric }: { rubric: Rubric }) {
  return (
    <section aria-labelledby="prices-heading">
      <Heading id="prices-heading">Prices of error</Heading>
      <div className="mt-2 grid gap-8">
        {distinctPrices(rubric).map(({ rule, label, sizes: [size] }) => {
          const line = rubric.lines.find(({ id }) => id === size?.lineId);
          if (!line || !size) return null;
          return (
            <div key={label} className="break-inside-avoid">
              <div className="mb-1 flex flex-wrap items-baseline gap-x-4">
                <h3 className="font-[640] first-letter:uppercase">{label}</h3>
                <p className="text-label text-ink-2">
                  drawn for {line.label}, {size.axis}
                  {rule.cap === null ? null : `; a size loses ${pointsAsText(rule.cap)} at most`}
                </p>
              </div>
              <FittedRuleFace
                unit={rubric.unit}
                target={line.target[size.axis]}
                {...faceScale(rubric, line, size.axis)}
                rule={rule}
                margin={rubric.margin}
                label={`${line.label}, ${size.axis}`}
              />
            </div>
          );
        })}
      </div>
    </section>
  );
}
