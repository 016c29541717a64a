'use client';

import { classNames } from '@/components/ui/class-names';
import { countLines } from '@/lib/practicals/count-lines';
import { isBlankLine } from '@/lib/practicals/line-changes';
import { ROW } from './cut-list-layout';
import { useEditor } from './editor-context';

/** What the list comes to: its lines, the pieces of one attempt, and the sizes that are read of them. */
export function CutListFoot() {
  const { settled } = useEditor();
  const { lines, pieces, sizes, unread } = countLines(settled.lines.filter((line) => !isBlankLine(line)));
  if (lines === 0) return null;
  const but =
    unread === 0 ? '' : `, without ${unread === 1 ? 'the line' : `the ${unread} lines`} not read yet`;
  return (
    <tfoot className="block border-t-outline border-ink">
      <tr className={classNames(ROW, 'items-baseline py-2 text-label')}>
        <th scope="row" className="col-span-3 text-left font-[640] lg:col-span-1 lg:col-start-2">
          {lines} {lines === 1 ? 'line' : 'lines'}
        </th>
        <td className="tnum col-span-3 px-1 lg:col-span-1">
          <span className="text-lead font-[640]">{pieces}</span>
          <span className="lg:sr-only"> {pieces === 1 ? 'piece' : 'pieces'}</span>
        </td>
        <td className="tnum col-span-6 px-1 text-ink-2 lg:col-end-[-1] lg:col-start-4">
          {sizes} sizes to read of each student{but}
        </td>
      </tr>
    </tfoot>
  );
}
