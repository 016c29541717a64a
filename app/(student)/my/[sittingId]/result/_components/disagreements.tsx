'use client';

import { useState } from 'react';
import { FittedRuleFace } from '@/components/rule/fitted-rule-face';
import { CrowsFoot } from '@/components/rule/rule-pointers';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { classNames } from '@/components/ui/class-names';
import { LengthText } from '@/components/ui/fraction';
import { Heading } from '@/components/ui/titles';
import type { ReadingPair } from '@/lib/practicals/compare-readings';
import { faceScale } from '@/lib/practicals/face-scale';
import { findPiece } from '@/lib/round/pieces';
import type { Rubric } from '@/lib/scoring';

interface DisagreementsProps {
  rubric: Rubric;
  pairs: readonly ReadingPair[];
  /** How many sizes hold a number on both sides. */
  compared: number;
}

/** Where own reading and bench lie furthest apart, on one rule face; a tap on a row shows it. */
export function Disagreements({ rubric, pairs, compared }: DisagreementsProps) {
  const [at, setAt] = useState(0);
  const pair = pairs[at] ?? pairs[0];
  return (
    <section>
      <Heading className="mb-2">Largest disagreements</Heading>
      {pair ? (
        <>
          <PairFace rubric={rubric} pair={pair} />
          <Table caption="largest disagreements" className="mt-2">
            <TableHead>
              <tr>
                <HeadCell>size</HeadCell>
                <HeadCell align="right">
                  <Foot kind="own" /> yours
                </HeadCell>
                <HeadCell align="right">
                  <Foot kind="bench" /> bench
                </HeadCell>
                <HeadCell align="right">apart</HeadCell>
              </tr>
            </TableHead>
            <TableBody>
              {pairs.map((each, index) => (
                <PairRow
                  key={`${each.lineId}/${each.ordinal}/${each.axis}`}
                  rubric={rubric}
                  pair={each}
                  shown={each === pair}
                  onShow={() => setAt(index)}
                />
              ))}
            </TableBody>
          </Table>
        </>
      ) : (
        <p>
          {compared > 0
            ? 'None: every size you both read by number reads the same.'
            : 'No size was read by number on both sides, so there is nothing to compare.'}
        </p>
      )}
    </section>
  );
}

function PairFace({ rubric, pair }: { rubric: Rubric; pair: ReadingPair }) {
  const place = findPiece(rubric, pair);
  if (!place || pair.bench.used === null || pair.own?.used == null) return null;
  const target = place.line.target[pair.axis];
  const readings = [pair.bench.used, pair.own.used];
  return (
    <FittedRuleFace
      unit={rubric.unit}
      target={target}
      {...faceScale(
        rubric,
        place.line,
        pair.axis,
        readings.map((ticks) => ticks - target),
      )}
      rule={place.line.sizes[pair.axis]}
      margin={rubric.margin}
      pointers={[
        { kind: 'bench', ticks: pair.bench.used },
        { kind: 'own', ticks: pair.own.used },
      ]}
      label={`${place.label}, ${pair.axis}`}
    />
  );
}

interface PairRowProps {
  rubric: Rubric;
  pair: ReadingPair;
  shown: boolean;
  onShow: () => void;
}

function PairRow({ rubric, pair, shown, onShow }: PairRowProps) {
  const { unit } = rubric;
  const { own, bench, apart, ordinal, ownOrdinal } = pair;
  const label = findPiece(rubric, pair)?.label;
  return (
    <tr>
      <RowHead className={classNames('py-0', shown && 'border-l-cursor border-act first:pl-2')}>
        <button
          type="button"
          aria-pressed={shown}
          onClick={onShow}
          className={classNames('min-h-11 w-full text-left', shown && 'font-[680]')}
        >
          {label}, {pair.axis}
          {ownOrdinal !== ordinal ? (
            <span className="block text-label font-[440] text-ink-2">your no. {ownOrdinal}</span>
          ) : null}
        </button>
      </RowHead>
      <Cell align="right">{own?.used != null ? <LengthText ticks={own.used} unit={unit} /> : null}</Cell>
      <Cell align="right">{bench.used !== null ? <LengthText ticks={bench.used} unit={unit} /> : null}</Cell>
      <Cell align="right" className="text-ink-2">
        {apart !== null ? <LengthText ticks={apart} unit={unit} /> : null}
      </Cell>
    </tr>
  );
}

function Foot({ kind }: { kind: 'own' | 'bench' }) {
  return (
    <svg aria-hidden="true" viewBox="0 0 18 18" className="inline-block size-[18px] align-[-0.2em]">
      <CrowsFoot kind={kind} x={9} y={17} size={15} />
    </svg>
  );
}
