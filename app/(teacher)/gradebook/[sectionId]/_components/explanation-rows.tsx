import type { ReactNode } from 'react';
import { DeviationStrip } from '@/components/rule/deviation-strip';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import type { ExplanationView } from '@/lib/contracts/gradebook';
import { count } from '../../../_components/names';
import { type SumProps, SumRows } from './sum-rows';

/** The points that fill half a strip in a row: the dearest size of most rubrics. */
const FULL = 400;

type LossRow = ExplanationView['rows'][number];

/** One row a lost point: target, reading, strip, points, and the same of the total. Both columns add up. */
export function ExplanationRows({ explanation }: { explanation: ExplanationView }) {
  const { rows, total, possible, unit } = explanation;
  const both = total !== possible;
  return (
    <table className="tnum w-full border-collapse text-label">
      <caption className="sr-only">where the points went</caption>
      <thead>
        <tr className="border-b border-hair text-small text-ink-2">
          <Head align="left">size</Head>
          <Head>target</Head>
          <Head>reading</Head>
          <Head>
            <span className="sr-only">under or over</span>
          </Head>
          <Head>points</Head>
          {both ? <Head>of {pointsAsText(total)}</Head> : null}
        </tr>
      </thead>
      <tbody>
        {rows.map((row, index) => (
          <Row
            key={`${row.kind}-${row.piece}-${row.what}-${index.toString()}`}
            row={row}
            unit={unit}
            both={both}
          />
        ))}
        <FreeRows explanation={explanation} both={both} />
      </tbody>
      <SumRows explanation={explanation} both={both} />
    </table>
  );
}

function Head({ align = 'right', children }: { align?: 'left' | 'right'; children: ReactNode }) {
  return (
    <th
      scope="col"
      className={`px-1 py-1.5 font-[480] first:pl-0 last:pr-0 ${align === 'left' ? 'text-left' : 'text-right'}`}
    >
      {children}
    </th>
  );
}

interface RowProps {
  row: LossRow;
  unit: 'in' | 'mm';
  both: boolean;
}

function Row({ row, unit, both }: RowProps) {
  const isSize = row.target !== null;
  return (
    <tr className="border-b border-hair">
      <th scope="row" colSpan={isSize ? 1 : 4} className="min-w-24 py-1.5 text-left font-[520]">
        {nameOf(row)}
      </th>
      {isSize ? <SizeCells row={row} unit={unit} /> : null}
      <td className="px-1 text-right">{pointsAsText(row.points)}</td>
      {both ? <td className="pl-1 text-right">{pointsAsText(row.ofTotal)}</td> : null}
    </tr>
  );
}

/** Target, reading or the word in its place, and the strip. */
function SizeCells({ row, unit }: Omit<RowProps, 'both'>) {
  const under = row.deviation !== null && row.deviation < 0;
  return (
    <>
      <td className="px-1 text-right">
        {row.target === null ? null : <LengthText ticks={row.target} unit={unit} />}
      </td>
      <td className="px-1 text-right font-[660]">
        {row.reading === null ? row.word : <LengthText ticks={row.reading} unit={unit} />}
      </td>
      <td className="w-12 px-0">
        {row.deviation === null ? null : (
          <DeviationStrip
            under={under ? row.points : 0}
            over={under ? 0 : row.points}
            full={FULL}
            className="w-12"
          />
        )}
      </td>
    </>
  );
}

const WHOLE: Partial<Record<LossRow['kind'], string>> = {
  missing: 'missing',
  held: 'held',
  gross: 'not that part',
  capped: 'no more than its worth',
  set: 'as the worst of its set',
};

function nameOf({ kind, piece, what }: LossRow): ReactNode {
  const word = WHOLE[kind] ?? what;
  return piece === '' ? (
    word
  ) : (
    <>
      {piece} <span className="font-[480] font-stretch-[88%] text-ink-2">{word}</span>
    </>
  );
}

/** What cost nothing, in a line or two. */
function FreeRows({ explanation: { free, goodChecks, unread, unit }, both }: SumProps) {
  const quiet = (key: string, children: ReactNode) => (
    <tr key={key} className="border-b border-hair text-ink-2">
      <th scope="row" colSpan={4} className="py-1.5 pr-1 text-left font-[480]">
        {children}
      </th>
      <td className="px-1 text-right">0</td>
      {both ? <td className="pl-1 text-right">0</td> : null}
    </tr>
  );
  return (
    <>
      {free.sizes > 0
        ? quiet(
            'free',
            <>
              {count(free.sizes, 'other size', 'other sizes')}
              {free.within === null ? (
                ' in the free band'
              ) : (
                <>
                  , all within <LengthText ticks={free.within} unit={unit} withUnit={false} />
                </>
              )}
            </>,
          )
        : null}
      {goodChecks.length > 0 ? quiet('checks', `${goodChecks.join(', ')}: good`) : null}
      {unread > 0 ? quiet('unread', `${count(unread, 'entry', 'entries')} not read yet`) : null}
    </>
  );
}
