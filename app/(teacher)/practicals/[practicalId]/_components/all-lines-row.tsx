'use client';

import { classNames } from '@/components/ui/class-names';
import { AXES } from '@/lib/scoring';
import { CellLabel } from './cell-label';
import { ChecksCell } from './checks-cell';
import { CELL, ROW } from './cut-list-layout';
import { useEditor } from './editor-context';
import { PriceCell } from './price-cell';
import { dearestOf } from './read-draft';
import { SheetCell } from './sheet-cell';

/** What holds for every line that says nothing else. */
export function AllLinesRow() {
  const { desk } = useEditor();
  const { all } = desk.draft;
  const dearest = dearestOf(desk.draft);
  return (
    <tr className={classNames(ROW, 'items-end border-b-outline border-ink py-2')}>
      <th
        scope="row"
        className="col-span-6 text-left text-lead font-[640] lg:col-span-5 lg:col-start-2 lg:pb-1"
      >
        all lines
      </th>
      <td className={CELL.wide}>
        <CellLabel>worth</CellLabel>
        <SheetCell path="all.worth" label="worth of a piece, all lines" />
      </td>
      <td className={CELL.wide}>
        <CellLabel>missing</CellLabel>
        <SheetCell path="all.missing" label="points for a missing piece, all lines" placeholder={all.worth} />
      </td>
      <td className={CELL.wide}>
        <CellLabel>checks</CellLabel>
        <ChecksCell lineId={null} checks={all.checks} />
      </td>
      {AXES.map((axis) => (
        <td key={axis} className={CELL.wide}>
          <CellLabel>price of {axis}</CellLabel>
          <PriceCell lineId={null} rule={all.sizes[axis]} path={`all.sizes.${axis}`} {...{ axis, dearest }} />
        </td>
      ))}
    </tr>
  );
}
