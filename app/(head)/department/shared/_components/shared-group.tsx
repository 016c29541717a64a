import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { LocalTime } from '@/components/ui/local-time';
import type { SharedPractical } from '@/lib/data/department/list-shared';
import { count, sayPeriods } from './words';

/** A practical on offer: its versions, where each is used, and which one is the department's. */
export function SharedGroup({ practical }: { practical: SharedPractical }) {
  const { title, versions } = practical;
  return (
    <section aria-label={`${title} by ${practical.ownerName}`}>
      <div className="mb-2 flex flex-wrap items-end gap-x-4 gap-y-1">
        <h2 className="font-title text-[1.4375rem] leading-7 font-[620]">{title}</h2>
        <p className="text-label text-ink-2">{about(practical)}</p>
      </div>
      <Table caption={`versions of ${title} by ${practical.ownerName}`}>
        <TableHead>
          <tr>
            <HeadCell className="w-[18%]">version</HeadCell>
            <HeadCell className="w-[20%] max-md:hidden">published</HeadCell>
            <HeadCell className="w-[22%]">used in</HeadCell>
            <HeadCell>the department’s</HeadCell>
            <HeadCell>
              <span className="sr-only">effect</span>
            </HeadCell>
          </tr>
        </TableHead>
        <TableBody>
          {versions.map(({ versionId, number, publishedAt, periods, approval }) => (
            <tr key={versionId}>
              <RowHead>
                <Link className="link whitespace-nowrap" href={`/department/versions/${versionId}`}>
                  version {number}
                  <span className="sr-only"> of {title}</span>
                </Link>
              </RowHead>
              <Cell className="max-md:hidden">
                <LocalTime at={publishedAt} style="day" />
              </Cell>
              <Cell>{periods.length > 0 ? sayPeriods(periods) : 'no sitting yet'}</Cell>
              <Cell>
                {approval ? (
                  <>
                    <strong className="font-[660]">yes</strong>, since{' '}
                    <LocalTime at={approval.approvedAt} style="day" />
                  </>
                ) : (
                  <span className="text-ink-2">no</span>
                )}
              </Cell>
              <Cell align="right">
                <Link className="link" href={`/department/shared/${versionId}`}>
                  what it would do
                  <span className="sr-only">
                    : version {number} of {title}
                  </span>
                </Link>
              </Cell>
            </tr>
          ))}
        </TableBody>
      </Table>
    </section>
  );
}

function about({ ownerName, lines, pieces, unit, copies, offered }: SharedPractical): string {
  const size = `${count(lines, 'line', 'lines')}, ${count(pieces, 'piece', 'pieces')}`;
  const words = [ownerName, size, unit === 'in' ? 'inches' : 'millimetres'];
  if (copies > 0) words.push(`${count(copies, 'copy', 'copies')} taken`);
  return `${words.join('; ')}${offered ? '' : '. Not on offer any more; approved, it can still be given'}`;
}
