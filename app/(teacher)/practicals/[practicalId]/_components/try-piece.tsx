'use client';

import { useId } from 'react';
import { KIND_WORDS } from '@/components/loss/loss-words';
import { classNames } from '@/components/ui/class-names';
import { pointsAsText } from '@/components/ui/points-text';
import { SelectControl } from '@/components/ui/select-control';
import { Heading } from '@/components/ui/titles';
import { isOneScale, pointsOfTotal } from '@/lib/practicals/both-scales';
import { pieceLabel } from '@/lib/practicals/task';
import type { TriedPiece, TriedResult } from '@/lib/practicals/try-piece';
import { AXES, type Axis, type Line, type Rubric } from '@/lib/scoring';
import { ReadingField } from './reading-field';
import { Band, CELL, Loss, NUMBER, Sum } from './try-rows';

interface TryPieceProps {
  rubric: Rubric;
  line: Line;
  axis: Axis;
  tried: TriedPiece;
  result: TriedResult;
  onChange(tried: TriedPiece): void;
}

/** One piece as it would be read: each size, each check, what each loses, and how it adds up in both scales. */
export function TryPiece({ rubric, line, axis, tried, result, onChange }: TryPieceProps) {
  const id = useId();
  const { explanation, lost, others, sheet, piece } = result;
  const one = isOneScale(rubric);
  const ofTotal = (kind: string, what: string) =>
    explanation.rows.find((row) => isOf(row, line) && row.kind === kind && row.what === what)?.ofTotal ?? 0;
  const adjusted = explanation.rows.filter(
    (row) => isOf(row, line) && (row.kind === 'gross' || row.kind === 'capped' || row.kind === 'set'),
  );
  const name = pieceLabel(line, 1);
  return (
    <section aria-labelledby={id} className="@container min-w-0">
      <div className="flex flex-wrap items-baseline gap-x-4 gap-y-1">
        <Heading id={id} className="first-letter:uppercase">
          {name}, if it reads so
        </Heading>
        <p className="text-label text-ink-2">
          Every other piece is on target.{' '}
          {one
            ? ''
            : `1 of ${pointsAsText(sheet.possible)} is ${pointsAsText(pointsOfTotal(rubric, 100))} of ${pointsAsText(sheet.total)}.`}
        </p>
      </div>
      <table className="tnum mt-1 w-full border-t border-ink text-left text-text">
        <caption className="sr-only">what this piece loses</caption>
        <thead className="text-small text-ink-2">
          <tr className="border-b border-hair">
            <th scope="col" className={classNames(CELL, 'font-[480]')}>
              size
            </th>
            <th scope="col" className={classNames(CELL, 'w-28 font-[480]')}>
              reads
            </th>
            <th scope="col" className={classNames(CELL, 'font-[480]')}>
              band
            </th>
            <th scope="col" className={classNames(NUMBER, 'font-[480]')}>
              loses
            </th>
            {one ? null : (
              <th scope="col" className={classNames(NUMBER, 'font-[480]')}>
                of {pointsAsText(sheet.total)}
              </th>
            )}
          </tr>
        </thead>
        <tbody className="[&>tr]:border-b [&>tr]:border-hair">
          {AXES.map((each) => (
            <tr key={each} className={each === axis ? 'font-[640]' : 'font-[440]'}>
              <th scope="row" className={classNames(CELL, '[font-weight:inherit]')}>
                {each}
              </th>
              <td className={CELL}>
                <ReadingField
                  label={`${each} of ${name} reads`}
                  target={line.target[each]}
                  deviation={tried.deviations[each]}
                  onRead={(deviation) =>
                    onChange({ ...tried, deviations: { ...tried.deviations, [each]: deviation } })
                  }
                />
              </td>
              <td className={classNames(CELL, 'text-label font-[440]')}>
                <Band rubric={rubric} line={line} axis={each} size={piece.sizes?.[each] ?? null} />
              </td>
              <Loss points={piece.sizes?.[each].lose ?? 0} ofTotal={ofTotal('size', each)} one={one} />
            </tr>
          ))}
          {line.checks.map((check) => (
            <tr key={check.id}>
              <th scope="row" className={classNames(CELL, 'font-[440]')}>
                {check.label}
              </th>
              <td colSpan={2} className={CELL}>
                <SelectControl
                  aria-label={`${check.label} of ${name}`}
                  value={String(tried.checks[check.id] ?? 0)}
                  onChange={(event) =>
                    onChange({
                      ...tried,
                      checks: { ...tried.checks, [check.id]: Number(event.target.value) },
                    })
                  }
                  className="min-h-8 border-b border-rule bg-plate pl-1 hover:border-ink"
                >
                  {check.levels.map((level, index) => (
                    <option key={`${index.toString()} ${level.label}`} value={index}>
                      {level.label}
                    </option>
                  ))}
                </SelectControl>
              </td>
              <Loss
                points={piece.checks.find(({ id: checkId }) => checkId === check.id)?.lose ?? 0}
                ofTotal={ofTotal('check', check.id)}
                one={one}
              />
            </tr>
          ))}
          {adjusted.map((row) => (
            <tr key={row.kind}>
              <th scope="row" colSpan={3} className={classNames(CELL, 'font-[520]')}>
                {row.kind === 'size' ? null : KIND_WORDS[row.kind]}
              </th>
              <Loss points={row.points} ofTotal={row.ofTotal} one={one} signed />
            </tr>
          ))}
        </tbody>
        <tfoot className="border-y border-ink [&>tr+tr]:border-t [&>tr+tr]:border-hair">
          <Sum label={`${name} loses, of ${pointsAsText(line.worth)}`} {...lost} one={one} strong />
          {others.points > 0 ? (
            <Sum label="the other pieces of this line lose as much" {...others} one={one} />
          ) : null}
          <Sum
            label={`leaves, of ${pointsAsText(sheet.possible)}`}
            points={explanation.kept.points}
            ofTotal={explanation.kept.ofTotal}
            one={one}
          />
          {sheet.provisional === null ? null : (
            <Sum
              label="score"
              points={one ? sheet.provisional : null}
              ofTotal={sheet.provisional}
              one={one}
              strong
            />
          )}
        </tfoot>
      </table>
      {piece.swapped ? (
        <p className="mt-1 text-label">
          Scored with thickness and width exchanged: read the other way round it loses less.
        </p>
      ) : null}
    </section>
  );
}

function isOf(row: { lineId: string; ordinal: number }, line: Line): boolean {
  return row.lineId === line.id && row.ordinal === 1;
}
