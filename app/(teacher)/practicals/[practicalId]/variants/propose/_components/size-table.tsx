'use client';

import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { LengthText } from '@/components/ui/fraction';
import type { ProposedVariantsView } from '@/lib/data/practicals/propose-variants';
import type { Unit } from '@/lib/length';
import type { NearestLent } from '@/lib/practicals/propose-variants-lent';
import type { CutListLine } from '@/lib/scoring/rubric-form';
import { SizeInput } from './size-input';
import { type MovingAxis, type Proposed, sizeKey } from './use-proposals';

interface SizeTableProps {
  view: ProposedVariantsView;
  proposed: Proposed;
  onType(lineId: string, axis: MovingAxis, text: string): void;
}

const MOVING: readonly MovingAxis[] = ['width', 'length'];

/** Every line with the original's sizes and its own, to be typed over, and the piece that comes nearest to it elsewhere. */
export function SizeTable({ view, proposed, onType }: SizeTableProps) {
  const { unit, original } = view;
  return (
    <Table caption={`sizes of variant ${proposed.letter}, ${unit === 'in' ? 'inches' : 'millimetres'}`}>
      <TableHead>
        <tr>
          <HeadCell>part</HeadCell>
          <HeadCell className="max-sm:hidden">thickness</HeadCell>
          <HeadCell className="w-32">width</HeadCell>
          <HeadCell className="w-32">length</HeadCell>
          <HeadCell className="max-md:hidden md:pl-8">nearest piece elsewhere</HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {original.task.cutList.lines.map((line) => (
          <tr key={line.id}>
            <RowHead>
              {line.label}
              {line.quantity > 1 ? <span className="text-ink-2"> × {line.quantity}</span> : null}
            </RowHead>
            <Cell className="max-sm:hidden">
              <LengthText ticks={line.target.thickness} unit={unit} className="text-lead text-ink-2" />
            </Cell>
            {MOVING.map((axis) => (
              <SizeCell key={axis} {...{ line, axis, unit, proposed, onType }} />
            ))}
            <Cell className="max-md:hidden md:pl-8">
              <Lent lent={proposed.judgement.lent.get(line.id)} unit={unit} />
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}

interface SizeCellProps {
  line: CutListLine;
  axis: MovingAxis;
  unit: Unit;
  proposed: Proposed;
  onType: SizeTableProps['onType'];
}

function SizeCell({ line, axis, unit, proposed, onType }: SizeCellProps) {
  const before = line.target[axis];
  const now = proposed.cutList.lines.find(({ id }) => id === line.id)?.target[axis] ?? before;
  return (
    <Cell className="min-w-24">
      <SizeInput
        label={`variant ${proposed.letter}, ${line.label}, ${axis}`}
        text={proposed.textAt(line.id, axis)}
        unit={unit}
        isMoved={now !== before}
        error={proposed.errors.get(sizeKey(line.id, axis))}
        onType={(text) => onType(line.id, axis, text)}
      />
      <p className="px-1 text-small text-ink-2">
        {now === before ? (
          'stays'
        ) : (
          <>
            was <LengthText ticks={before} unit={unit} />
          </>
        )}
      </p>
    </Cell>
  );
}

function Lent({ lent, unit }: { lent: NearestLent | undefined; unit: Unit }) {
  if (!lent) return null;
  const off = <LengthText ticks={lent.off} unit={unit} withUnit={unit === 'mm'} />;
  return (
    <>
      {lent.label} of {lent.of}
      <span className="block text-label">
        {lent.verdict === 'passes' ? (
          <strong>{lent.off === 0 ? 'the same size: it fits' : <>within {off}: it can be lent</>}</strong>
        ) : (
          <span className="text-ink-2">
            {off} off: {lent.verdict === 'gross' ? 'not that part' : 'past the last band twice over'}
          </span>
        )}
      </span>
    </>
  );
}
