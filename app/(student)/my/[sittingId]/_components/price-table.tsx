import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import type { Length } from '@/lib/length';
import { isOneScale, pointsOfTotal, totalPoints } from '@/lib/practicals/both-scales';
import type { Band, Points, Rubric, SizeRule } from '@/lib/scoring';
import { PointsInBoth } from '../../_components/points-in-both';

interface PriceTableProps {
  rubric: Rubric;
  rule: SizeRule;
}

/** What each step off costs, on both scales; one column where over and under cost the same. */
export function PriceTable({ rubric, rule }: PriceTableProps) {
  const sides = sidesOf(rule);
  const rows = rowsOf(rule);
  const example = rows.find(({ under, over }) => Math.max(under, over) > 0);
  return (
    <>
      <Table caption="what each step off costs" className="mt-3">
        <TableHead>
          <tr>
            <HeadCell>off by</HeadCell>
            {sides.map(({ label }) => (
              <HeadCell key={label} align="right">
                {label} loses
              </HeadCell>
            ))}
          </tr>
        </TableHead>
        <TableBody>
          {rows.map((row) => (
            <tr key={row.within ?? 'beyond'}>
              <RowHead>
                {row.within === null ? (
                  'more'
                ) : (
                  <>
                    up to <LengthText ticks={row.within} unit={rubric.unit} />
                  </>
                )}
              </RowHead>
              {sides.map(({ label, side }) => (
                <Cell key={label} align="right">
                  <Loses rubric={rubric} points={row[side]} />
                </Cell>
              ))}
            </tr>
          ))}
        </TableBody>
      </Table>
      <p className="mt-2 text-label text-ink-2">
        {example ? (
          <>
            <PointsInBoth rubric={rubric} points={Math.max(example.under, example.over)} sentence />.{' '}
          </>
        ) : null}
        {rubric.margin > 0 ? (
          <>
            The instrument is allowed for: <LengthText ticks={rubric.margin} unit={rubric.unit} withUnit />{' '}
            past each edge still counts as inside.
          </>
        ) : null}
      </p>
    </>
  );
}

function Loses({ rubric, points }: { rubric: Rubric; points: Points }) {
  if (points === 0) return '0';
  return (
    <>
      <strong>{pointsAsText(points)}</strong>
      {isOneScale(rubric) ? null : (
        <span className="text-ink-2">
          {' '}
          ({pointsAsText(pointsOfTotal(rubric, points))} of {pointsAsText(totalPoints(rubric))})
        </span>
      )}
    </>
  );
}

interface Row {
  within: Length | null;
  under: Points;
  over: Points;
}

function rowsOf({ over, under, beyondOver, beyondUnder, cap }: SizeRule): Row[] {
  const capped = (points: Points) => (cap === null ? points : Math.min(points, cap));
  const priceAt = (bands: Band[], beyond: Points, off: Length) =>
    capped(bands.find(({ within }) => off <= within)?.lose ?? beyond);
  const edges = [...new Set([...over, ...under].map(({ within }) => within))].sort((a, b) => a - b);
  return [
    ...edges.map((within) => ({
      within,
      under: priceAt(under, beyondUnder, within),
      over: priceAt(over, beyondOver, within),
    })),
    { within: null, under: capped(beyondUnder), over: capped(beyondOver) },
  ];
}

function sidesOf(rule: SizeRule): { label: string; side: 'under' | 'over' }[] {
  const same = rowsOf(rule).every(({ under, over }) => under === over);
  return same
    ? [{ label: 'over or under', side: 'over' }]
    : [
        { label: 'under', side: 'under' },
        { label: 'over', side: 'over' },
      ];
}
