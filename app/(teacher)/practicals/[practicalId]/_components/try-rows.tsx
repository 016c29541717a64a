import { classNames } from '@/components/ui/class-names';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import type { Axis, Line, Points, Rubric, SizeSheet } from '@/lib/scoring';

export const CELL = 'py-1 pr-3 align-baseline last:pr-0';
export const NUMBER = `${CELL} text-right whitespace-nowrap`;

interface LossProps {
  points: Points | null;
  ofTotal: Points;
  one: boolean;
  signed?: boolean;
}

export function Loss({ points, ofTotal, one, signed = false }: LossProps) {
  const plus = signed && (points ?? 0) > 0 ? '+' : '';
  return (
    <>
      <td className={NUMBER}>{points === null ? '' : `${plus}${pointsAsText(points)}`}</td>
      {one ? null : <td className={NUMBER}>{`${plus}${pointsAsText(ofTotal)}`}</td>}
    </>
  );
}

export function Sum({ label, strong, ...loss }: LossProps & { label: string; strong?: boolean }) {
  return (
    <tr className={strong ? 'font-[660]' : 'font-[440]'}>
      <th scope="row" colSpan={3} className={classNames(CELL, '[font-weight:inherit]')}>
        {label}
      </th>
      <Loss {...loss} />
    </tr>
  );
}

interface BandProps {
  rubric: Rubric;
  line: Line;
  axis: Axis;
  size: SizeSheet | null;
}

/** Which band a reading fell in, whether the most that a size loses held it, and whether it is gross. */
export function Band({ rubric, line, axis, size }: BandProps) {
  if (!size || size.deviation === null) return null;
  const rule = line.sizes[axis];
  const [bands, beyond] = size.deviation < 0 ? [rule.under, rule.beyondUnder] : [rule.over, rule.beyondOver];
  const band = typeof size.band === 'number' ? bands[size.band] : undefined;
  const edge = band?.within ?? bands.at(-1)?.within ?? 0;
  const full = band?.lose ?? beyond;
  const { grossLimit, margin, unit } = rubric;
  const isGross = grossLimit !== null && Math.abs(size.deviation) > grossLimit + margin;
  return (
    <>
      {size.deviation === 0 ? 'on target' : <LengthText ticks={size.deviation} unit={unit} signed />}
      {size.deviation === 0 ? null : (
        <>
          , {band ? 'within' : 'past'} <LengthText ticks={edge} unit={unit} />
        </>
      )}
      {full > size.lose ? `, held at the most, ${pointsAsText(size.lose)}` : ''}
      {isGross && grossLimit !== null ? (
        <strong className="font-[640]">
          , gross: past <LengthText ticks={grossLimit} unit={unit} />
        </strong>
      ) : null}
    </>
  );
}
