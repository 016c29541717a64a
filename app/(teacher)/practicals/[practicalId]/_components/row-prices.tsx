'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import { isException } from '@/lib/practicals/draft';
import { AXES } from '@/lib/scoring';
import { AsAllKey } from './as-all-key';
import { CellLabel } from './cell-label';
import { ChecksCell } from './checks-cell';
import { CELL } from './cut-list-layout';
import { LineCell } from './line-cell';
import { PriceCell } from './price-cell';
import type { CutListRowProps } from './row-props';

/** What a line is worth and what its errors cost; folded away on narrow paper while all of it is as for all lines. */
export function RowPrices({ row, name }: { row: CutListRowProps; name: string }) {
  const { line, index, selected, dearest, select } = row;
  const [opened, setOpened] = useState(false);
  const folded = !opened && !isException(line);
  const priced = classNames(CELL.wide, folded && 'max-lg:hidden');
  return (
    <>
      {folded ? (
        <td className="col-span-6 lg:hidden">
          <Button kind="quiet" size="small" className="px-0" onClick={() => setOpened(true)}>
            priced as all lines: change it for {name}
          </Button>
        </td>
      ) : null}
      {(['worth', 'missing'] as const).map((column) => (
        <td key={column} className={priced}>
          <CellLabel>{column}</CellLabel>
          <LineCell {...{ row, column }} label={`${column}, ${name}`} />
        </td>
      ))}
      <td className={priced}>
        <CellLabel>checks</CellLabel>
        {line.checks === null ? (
          <AsAllKey
            label={`checks, ${name}: as all`}
            selected={selected === 'checks'}
            onPress={() => select({ kind: 'checks', lineId: line.id })}
          />
        ) : (
          <ChecksCell lineId={line.id} checks={line.checks} />
        )}
      </td>
      {AXES.map((axis) => (
        <td key={axis} className={priced}>
          <CellLabel>price of {axis}</CellLabel>
          {line.sizes[axis] === null ? (
            <AsAllKey
              label={`price of ${axis}, ${name}: as all lines`}
              selected={selected === axis}
              onPress={() => select({ kind: 'size', lineId: line.id, axis })}
            />
          ) : (
            <PriceCell
              lineId={line.id}
              rule={line.sizes[axis]}
              path={`lines.${index}.sizes.${axis}`}
              {...{ axis, dearest }}
            />
          )}
        </td>
      ))}
    </>
  );
}
