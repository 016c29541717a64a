import type { ReactNode } from 'react';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import type { PublicationPreview, StudentName } from '@/lib/data/sittings/preview-publication';
import { spokenName } from '../../../../_components/names';

/** What would go out, one row an outcome, with the names where a teacher may want to look again. */
export function OutcomeTable({ preview }: { preview: PublicationPreview }) {
  const { scored, zero, absent, excused, unread, incomplete, conflicts, withBonus } = preview;
  return (
    <Table caption="what goes out">
      <TableHead>
        <tr>
          <HeadCell align="right" className="w-16">
            students
          </HeadCell>
          <HeadCell>go out as</HeadCell>
          <HeadCell>who</HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        <Row number={scored} word="scored">
          {withBonus > 0 ? `${withBonus} of them with points for the prediction` : 'a number each'}
        </Row>
        <Row number={zero} word="zero">
          {zero > 0 ? 'the number 0, which counts in the mean' : null}
        </Row>
        <Row number={absent.length} word="absent">
          <Names of={absent} />
        </Row>
        <Row number={excused.length} word="excused">
          <Names of={excused} />
        </Row>
        <Row number={unread.length} word="not read" note="nothing recorded">
          <Names of={unread} />
        </Row>
        <Row number={incomplete.length} word="not read" note="begun, sizes left">
          <Names of={incomplete} />
        </Row>
        <Row number={conflicts.length} word="not yet" note="two readings to settle">
          <Names of={conflicts} />
        </Row>
      </TableBody>
    </Table>
  );
}

interface RowProps {
  number: number;
  word: string;
  note?: string;
  children: ReactNode;
}

function Row({ number, word, note, children }: RowProps) {
  const quiet = number === 0 ? 'text-ink-2' : undefined;
  return (
    <tr className={quiet}>
      <Cell align="right" className={number === 0 ? 'text-heading font-[480]' : 'text-heading'}>
        {number}
      </Cell>
      <RowHead className="whitespace-nowrap">
        {word}
        {note ? <span className="block text-label font-[480] text-ink-2">{note}</span> : null}
      </RowHead>
      <Cell>{number === 0 ? 'none' : children}</Cell>
    </tr>
  );
}

function Names({ of: students }: { of: readonly StudentName[] }) {
  return students.map(spokenName).join(', ');
}
