import { Cell } from '@/components/table/table';
import { LengthText } from '@/components/ui/fraction';
import type { LossRow } from '@/lib/practicals/explain-score';
import type { Axis, Rubric } from '@/lib/scoring';
import { KIND_WORDS, lossLabel } from './loss-words';

/** What lost the points, and the band it fell in. */
export function LossCause({ rubric, row }: { rubric: Rubric; row: LossRow }) {
  return (
    <>
      {lossLabel(rubric, row)}
      <span className="block text-label font-[440] text-ink-2">
        {row.kind === 'size' ? <Band rubric={rubric} row={row} /> : KIND_WORDS[row.kind]}
      </span>
    </>
  );
}

/** Target and reading of a row that is about a size; empty cells otherwise. */
export function LossSizes({ rubric, row }: { rubric: Rubric; row: LossRow }) {
  const axis = axisOf(row);
  const line = rubric.lines.find(({ id }) => id === row.lineId);
  return (
    <>
      <Cell align="right">
        {axis && line ? <LengthText ticks={line.target[axis]} unit={rubric.unit} /> : null}
      </Cell>
      <Cell align="right">
        {row.size?.reading != null ? <LengthText ticks={row.size.reading} unit={rubric.unit} /> : null}
        {row.size?.band === 'spoiled' ? 'spoiled' : null}
      </Cell>
    </>
  );
}

function Band({ rubric, row }: { rubric: Rubric; row: LossRow }) {
  const { size } = row;
  const axis = axisOf(row);
  const rule = axis && rubric.lines.find(({ id }) => id === row.lineId)?.sizes[axis];
  if (!size || !rule) return null;
  if (size.band === 'spoiled') return 'could not be measured';
  if (size.deviation === null) return null;
  const bands = size.deviation < 0 ? rule.under : rule.over;
  const edge = typeof size.band === 'number' ? bands[size.band]?.within : bands.at(-1)?.within;
  return (
    <>
      <LengthText ticks={size.deviation} unit={rubric.unit} signed />
      {edge === undefined ? null : (
        <>
          , {typeof size.band === 'number' ? 'within' : 'beyond'}{' '}
          <LengthText ticks={edge} unit={rubric.unit} />
        </>
      )}
    </>
  );
}

function axisOf({ kind, what }: LossRow): Axis | null {
  return kind === 'size' && (what === 'thickness' || what === 'width' || what === 'length') ? what : null;
}
