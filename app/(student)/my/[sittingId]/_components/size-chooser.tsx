'use client';

import { useState } from 'react';
import { OtherUnitSwitch } from '@/components/other-unit/other-unit';
import { PartDrawing } from '@/components/part/part-drawing';
import { FittedRuleFace } from '@/components/rule/fitted-rule-face';
import { Heading } from '@/components/ui/titles';
import { distinctPrices, samePrice } from '@/lib/practicals/distinct-prices';
import { faceScale } from '@/lib/practicals/face-scale';
import type { Axis, Line, Rubric } from '@/lib/scoring';
import { AxisKeys } from './axis-keys';
import { LineRow } from './line-row';
import { PriceTable } from './price-table';

interface SizeChooserProps {
  rubric: Rubric;
  lineNotes: Readonly<Record<string, string>>;
}

/** What to make and what error costs, one size at a time: tap a part, tap an axis. */
export function SizeChooser({ rubric, lineNotes }: SizeChooserProps) {
  const [first] = rubric.lines;
  const [lineId, setLineId] = useState(first?.id ?? '');
  const [axis, setAxis] = useState<Axis>('length');
  const line = rubric.lines.find(({ id }) => id === lineId) ?? first;
  if (!line) return null;
  const choose = (size: { lineId: string; axis: Axis }) => {
    setLineId(size.lineId);
    setAxis(size.axis);
  };
  return (
    <section aria-label="what to make">
      <LineRow rubric={rubric} chosen={line.id} onChoose={setLineId} />
      <div className="mx-auto mt-3 max-w-[30rem]">
        <PartDrawing size={line.target} unit={rubric.unit} axis={axis} note label={line.label} height={340} />
      </div>
      {lineNotes[line.id] ? <p className="mt-1 max-w-[62ch]">{lineNotes[line.id]}</p> : null}
      <AxisKeys target={line.target} unit={rubric.unit} axis={axis} onAxis={setAxis} />
      <OtherUnitSwitch unit={rubric.unit} className="mt-1" />
      <SizePrice rubric={rubric} line={line} axis={axis} />
      <OtherPrices rubric={rubric} line={line} axis={axis} onChoose={choose} />
    </section>
  );
}

function SizePrice({ rubric, line, axis }: { rubric: Rubric; line: Line; axis: Axis }) {
  return (
    <>
      <Heading className="mt-6 mb-2">
        {line.label}, {axis}
      </Heading>
      <FittedRuleFace
        unit={rubric.unit}
        target={line.target[axis]}
        {...faceScale(rubric, line, axis)}
        rule={line.sizes[axis]}
        margin={rubric.margin}
        label={`${line.label}, ${axis}`}
      />
      <PriceTable rubric={rubric} rule={line.sizes[axis]} />
    </>
  );
}

interface OtherPricesProps {
  rubric: Rubric;
  line: Line;
  axis: Axis;
  onChoose: (size: { lineId: string; axis: Axis }) => void;
}

/** Which sizes cost the same, and a way to those that don't. */
function OtherPrices({ rubric, line, axis, onChoose }: OtherPricesProps) {
  const prices = distinctPrices(rubric);
  const here = line.sizes[axis];
  const [same] = prices.filter(({ rule }) => samePrice(rule, here));
  const others = prices.filter(({ rule }) => !samePrice(rule, here));
  return (
    <>
      <p className="mt-2 text-label text-ink-2">This is the price of {same?.label}.</p>
      {others.length > 0 ? (
        <ul className="mt-2 border-t border-hair">
          {others.map(({ label, sizes: [size] }) => (
            <li key={label} className="border-b border-hair">
              <button
                type="button"
                onClick={() => size && onChoose(size)}
                className="flex min-h-11 w-full items-center gap-2 py-2 text-left text-act underline underline-offset-4"
              >
                another price: {label}
              </button>
            </li>
          ))}
        </ul>
      ) : null}
    </>
  );
}
