'use client';

import { HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { Heading } from '@/components/ui/titles';
import { excusedKey } from '@/lib/contracts/accommodations';
import { AXES, type Axis } from '@/lib/scoring';
import type { Typed } from './use-typed';

/** A box for every line and axis that can be excused: axes for the term, whole lines in a sitting too. */
export function ExcusedPart({ typed, error }: { typed: Typed; error: string[] | null | undefined }) {
  const lines = typed.sittingId === null ? [] : (typed.sittings[0]?.rubric.lines ?? []);
  return (
    <section>
      <Heading className="mb-1">Excused</Heading>
      <p className="mb-2 max-w-[62ch] text-label text-ink-2">
        Not held against the student: it costs nothing and need not be read. The points of an excused line go
        to the others, so that the total stays.
      </p>
      <div className="max-w-[44rem]">
        <Table caption="sizes and lines that are excused">
          <TableHead>
            <tr>
              <HeadCell>line</HeadCell>
              {lines.length > 0 ? <HeadCell>whole line</HeadCell> : null}
              {AXES.map((axis) => (
                <HeadCell key={axis}>{axis}</HeadCell>
              ))}
            </tr>
          </TableHead>
          <TableBody>
            <tr className="border-b-outline border-rule">
              <RowHead className="align-middle">every line</RowHead>
              {lines.length > 0 ? <td /> : null}
              {AXES.map((axis) => (
                <Box key={axis} typed={typed} lineId={null} axis={axis} name={`${axis} of every line`} />
              ))}
            </tr>
            {lines.map(({ id, label, quantity }) => (
              <tr key={id}>
                <RowHead className="align-middle">
                  {label}
                  {quantity > 1 ? <span className="text-label text-ink-2">, {quantity} pieces</span> : null}
                </RowHead>
                <Box typed={typed} lineId={id} axis={null} name={`${label}, the whole line`} />
                {AXES.map((axis) => (
                  <Box key={axis} typed={typed} lineId={id} axis={axis} name={`${axis} of ${label}`} />
                ))}
              </tr>
            ))}
          </TableBody>
        </Table>
      </div>
      {error?.map((text) => (
        <p key={text} role="alert" className="mt-1 text-label font-[580] text-refuse">
          {text}
        </p>
      ))}
    </section>
  );
}

interface BoxProps {
  typed: Typed;
  lineId: string | null;
  axis: Axis | null;
  name: string;
}

/** A box that a wider one covers is checked with it and cannot be pressed. */
function Box({ typed, lineId, axis, name }: BoxProps) {
  const { excused } = typed.typed;
  const key = excusedKey(lineId, axis);
  const covered =
    lineId !== null &&
    axis !== null &&
    (excused.includes(excusedKey(lineId, null)) || excused.includes(excusedKey(null, axis)));
  return (
    <td className="px-2 py-1">
      <label className="inline-flex h-10 w-12 cursor-pointer items-center">
        <input
          type="checkbox"
          name="excused"
          value={key}
          aria-label={name}
          checked={covered || excused.includes(key)}
          disabled={covered}
          onChange={() => typed.toggle(key)}
          className="choice-check size-6 cursor-pointer appearance-none border-outline border-ink bg-plate checked:border-act checked:bg-act disabled:cursor-default disabled:border-dashed disabled:border-rule disabled:bg-ink-2"
        />
      </label>
    </td>
  );
}
