import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import type { PracticalListItem } from '@/lib/data/practicals/list-practicals';
import { archivePracticalAction, copyPracticalAction } from '../actions';
import { LocalTime } from './local-time';
import { PressForm } from './press-form';
import { sayPieces } from './say-pieces';

/** One’s own practicals: what each asks for, what is published of it, and what is given out. */
export function PracticalTable({
  practicals,
  archived,
}: {
  practicals: PracticalListItem[];
  archived: boolean;
}) {
  return (
    <Table caption={archived ? 'practicals put away' : 'your practicals'}>
      <TableHead>
        <tr>
          <HeadCell>practical</HeadCell>
          <HeadCell>unit</HeadCell>
          <HeadCell>cut list</HeadCell>
          <HeadCell>published</HeadCell>
          <HeadCell align="right">sittings</HeadCell>
          <HeadCell>typed last</HeadCell>
          <HeadCell>
            <span className="sr-only">what you can do</span>
          </HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {practicals.map((practical) => (
          <tr key={practical.practicalId}>
            <RowHead>
              <Link
                href={`/practicals/${practical.practicalId}`}
                className="inline-flex min-h-8 items-center font-title text-[1.1875rem] font-[620] underline decoration-hair underline-offset-4 hover:decoration-ink"
              >
                {practical.title}
              </Link>
            </RowHead>
            <Cell>{practical.unit === 'in' ? 'inches' : 'mm'}</Cell>
            <Cell className="whitespace-nowrap">{sayPieces(practical.lines, practical.pieces)}</Cell>
            <Cell className="whitespace-nowrap">
              {practical.version ? (
                `version ${practical.version.number}`
              ) : (
                <span className="text-ink-2">not yet</span>
              )}
            </Cell>
            <Cell align="right">{practical.sittings}</Cell>
            <Cell className="whitespace-nowrap">
              <LocalTime at={practical.savedAt} style="day" />
            </Cell>
            <Cell>
              <div className="flex justify-end gap-2">
                <PressForm
                  action={copyPracticalAction}
                  fields={{ practicalId: practical.practicalId }}
                  label="copy"
                  fullLabel={`copy ${practical.title}`}
                />
                <PressForm
                  action={archivePracticalAction}
                  fields={{ practicalId: practical.practicalId, archived: archived ? 'no' : 'yes' }}
                  label={archived ? 'bring back' : 'put away'}
                  fullLabel={`${archived ? 'bring back' : 'put away'} ${practical.title}`}
                />
              </div>
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
