import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import type { SectionListView } from '@/lib/data/sections/list-sections';
import { sayPeriod } from '../../_components/names';

/** The sections of a department, each with the way to its gradebook. */
export function SectionLinks({ sections }: { sections: readonly SectionListView[] }) {
  return (
    <Table caption="sections, the latest term first">
      <TableHead>
        <tr>
          <HeadCell className="w-[1%] pr-8">period</HeadCell>
          <HeadCell>section</HeadCell>
          <HeadCell>term</HeadCell>
          <HeadCell align="right">students</HeadCell>
          <HeadCell align="right">sittings</HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {sections.map(({ sectionId, name, period, termName, studentCount, sittings }) => (
          <tr key={sectionId}>
            <Cell className="pr-8 font-title text-title">{period}</Cell>
            <RowHead className="text-lead">
              <Link
                className="link inline-block py-1"
                href={`/gradebook/${sectionId}`}
                aria-label={`${name}, ${sayPeriod(period)}`}
              >
                {name}
              </Link>
            </RowHead>
            <Cell>{termName}</Cell>
            <Cell align="right">{studentCount}</Cell>
            <Cell align="right">{sittings}</Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
