import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { sayDayOf } from '@/components/ui/days';
import type { SittingListView } from '@/lib/data/sittings/list-sittings';
import { count } from '../../_components/names';
import { ClassStrip } from './class-strip';

interface SittingTableProps {
  caption: string;
  sittings: readonly SittingListView[];
}

export function SittingTable({ caption, sittings }: SittingTableProps) {
  return (
    <Table caption={caption}>
      <TableHead>
        <tr>
          <HeadCell className="w-[1%] pr-4 md:pr-8">period</HeadCell>
          <HeadCell>practical</HeadCell>
          <HeadCell className="max-md:hidden">the class at the bench</HeadCell>
          <HeadCell className="max-sm:hidden">{sittings[0]?.published ? 'published' : 'due'}</HeadCell>
          <HeadCell>
            <span className="sr-only">go to</span>
          </HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {sittings.map((sitting) => (
          <SittingRow key={sitting.sittingId} sitting={sitting} />
        ))}
      </TableBody>
    </Table>
  );
}

function SittingRow({ sitting }: { sitting: SittingListView }) {
  const { sittingId, sectionId, title, sectionName, period, versionNumber, conflicts, published } = sitting;
  const where = `${title}, period ${period}`;
  return (
    <tr>
      <Cell className="align-middle pr-4 font-title text-title whitespace-nowrap md:pr-8">{period}</Cell>
      <RowHead className="align-middle text-lead">
        <Link className="link inline-block py-1" href={`/sittings/${sittingId}`} aria-label={where}>
          {title}
        </Link>
        <p className="text-label font-[480] text-ink-2">
          {sectionName}, version {versionNumber}
          {conflicts > 0 ? (
            <strong className="text-ink">, {count(conflicts, 'size', 'sizes')} with two readings</strong>
          ) : null}
        </p>
        <p className="mt-1 text-label font-[480] md:hidden">{inWords(sitting)}</p>
      </RowHead>
      <Cell className="align-middle max-md:hidden">
        <ClassStrip {...sitting} />
        <p className="mt-1 text-label text-ink-2">{inWords(sitting)}</p>
      </Cell>
      <Cell className="align-middle whitespace-nowrap max-sm:hidden">
        <When sitting={sitting} />
      </Cell>
      <Cell align="right" className="align-middle whitespace-nowrap">
        {published ? (
          <Link
            className="link inline-block py-1"
            href={`/gradebook/${sectionId}`}
            aria-label={`gradebook: ${where}`}
          >
            gradebook
          </Link>
        ) : (
          <Link
            className="link inline-block py-1"
            href={`/round/${sittingId}`}
            aria-label={`to the bench: ${where}`}
          >
            to the bench
          </Link>
        )}
      </Cell>
    </tr>
  );
}

function When({ sitting: { published, publishedAt, dueOn, timeZone } }: { sitting: SittingListView }) {
  if (published && publishedAt) return sayDayOf(publishedAt, timeZone);
  return dueOn ? sayDayOf(`${dueOn}T12:00:00Z`, 'UTC') : <span className="text-ink-2">no day</span>;
}

function inWords({ students, read, begun, away }: SittingListView): string {
  const parts = [
    `${read} of ${students} read`,
    begun > 0 ? `${begun} begun` : null,
    away > 0 ? `${away} absent or excused` : null,
  ];
  return parts.filter(Boolean).join(', ');
}
