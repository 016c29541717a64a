import { DeviationStrip } from '@/components/rule/deviation-strip';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import { type AxisLoss, lostByAxis } from '@/lib/practicals/lost-by-axis';
import type { ScoreSheet } from '@/lib/scoring';

/** Points lost by axis and side, to one scale. */
export function WherePointsWent({ sheet }: { sheet: ScoreSheet }) {
  const { axes, other } = lostByAxis(sheet);
  const full = Math.max(100, ...axes.flatMap(({ under, over }) => [under, over]));
  return (
    <section>
      <Heading className="mb-2">
        Where {pointsAsText(sheet.lost)} of {pointsAsText(sheet.possible)} points went
      </Heading>
      <dl className="grid grid-cols-[auto_minmax(0,1fr)_auto] items-center gap-x-3 gap-y-1.5">
        {axes.map((loss) => (
          <AxisRow key={loss.axis} loss={loss} full={full} />
        ))}
        {other === 0 ? null : (
          <>
            <dt className="col-span-2">
              {other > 0 ? 'checks and whole pieces' : 'spared: a piece loses no more than its worth'}
            </dt>
            <dd className="tnum text-right font-[620]">{pointsAsText(other)}</dd>
          </>
        )}
      </dl>
    </section>
  );
}

function AxisRow({ loss, full }: { loss: AxisLoss; full: number }) {
  const { axis, under, over, spoiled, dearestUnder, dearestOver } = loss;
  const parts = [
    under > 0 ? `${pointsAsText(under)} under` : null,
    over > 0 ? `${pointsAsText(over)} over` : null,
    spoiled > 0 ? `${pointsAsText(spoiled)} spoiled` : null,
  ].filter((part) => part !== null);
  return (
    <>
      <dt>{axis}</dt>
      <dd className="min-w-0">
        <DeviationStrip
          under={under}
          over={over}
          full={full}
          dearestUnder={dearestUnder}
          dearestOver={dearestOver}
          kind="wide"
          label={axis}
          className="mx-auto"
        />
      </dd>
      <dd className={parts.length > 0 ? 'text-right font-[620]' : 'text-right text-ink-2'}>
        {parts.length > 0 ? parts.join(', ') : 'none'}
      </dd>
    </>
  );
}
