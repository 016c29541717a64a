import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { LocalTime } from '@/components/ui/local-time';
import type { PracticalListItem } from '@/lib/data/practicals/list-practicals';
import { archivePracticalAction, copyPracticalAction } from '../actions';
import { PressForm } from './press-form';
import { sayPieces } from './say-pieces';
import { SourceLine } from './source-line';

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
          <HeadCell className="max-md:hidden">unit</HeadCell>
          <HeadCell className="max-md:hidden">cut list</HeadCell>
          <HeadCell className="max-md:hidden">published</HeadCell>
          <HeadCell align="right" className="max-md:hidden">
            sittings
          </HeadCell>
          <HeadCell className="max-md:hidden">typed last</HeadCell>
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
              <span className="block text-small font-[440] text-ink-2 md:hidden">
                {sayPieces(practical.lines, practical.pieces)};{' '}
                {practical.version ? sayPublished(practical) : 'not published yet'}
              </span>
              {practical.source ? (
                <SourceLine
                  practicalId={practical.practicalId}
                  unit={practical.unit}
                  source={practical.source}
                />
              ) : null}
            </RowHead>
            <Cell className="max-md:hidden">{practical.unit === 'in' ? 'inches' : 'mm'}</Cell>
            <Cell className="whitespace-nowrap max-md:hidden">
              {sayPieces(practical.lines, practical.pieces)}
            </Cell>
            <Cell className="max-md:hidden">
              {practical.version ? sayPublished(practical) : <span className="text-ink-2">not yet</span>}
            </Cell>
            <Cell align="right" className="max-md:hidden">
              {practical.sittings}
            </Cell>
            <Cell className="whitespace-nowrap max-md:hidden">
              <LocalTime at={practical.savedAt} style="day" />
            </Cell>
            <Cell>
              <div className="flex justify-end gap-2 whitespace-nowrap">
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

/** "version 2, offered; version 1 is the department’s" */
function sayPublished({ version, offered, approvedNumber }: PracticalListItem): string {
  const newest = `version ${version?.number}`;
  const isDepartments = approvedNumber !== null && approvedNumber === version?.number;
  const words = [newest, ...(isDepartments ? ['the department’s'] : []), ...(offered ? ['offered'] : [])];
  const earlier =
    approvedNumber !== null && !isDepartments ? `; version ${approvedNumber} is the department’s` : '';
  return `${words.join(', ')}${earlier}`;
}
