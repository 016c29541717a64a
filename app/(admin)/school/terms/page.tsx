import type { Metadata } from 'next';
import Link from 'next/link';
import { DeskPage } from '@/components/shell/desk-page';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import { sayDay } from '@/components/ui/days';
import { EmptyState } from '@/components/ui/empty-state';
import { Heading } from '@/components/ui/titles';
import { listTerms, type TermView } from '@/lib/data/school/list-terms';
import { pageActor, pageValue } from '@/lib/transport/page';
import { TermForm } from '../_components/term-form';

export const metadata: Metadata = { title: 'Terms' };

export default async function TermsPage() {
  const terms = pageValue(await listTerms(await pageActor(), {}));
  return (
    <DeskPage title="Terms">
      <div className="grid grid-cols-[minmax(0,1fr)] items-start gap-x-12 gap-y-8 lg:grid-cols-[minmax(0,1fr)_20rem]">
        {terms.length === 0 ? (
          <EmptyState title="No terms yet">
            Every section belongs to a term, and so does what is exported for it. Add the term you are in
            first.
          </EmptyState>
        ) : (
          <TermTable terms={terms} />
        )}
        <section>
          <Heading className="mb-4 border-b border-ink pb-1">add a term</Heading>
          <TermForm />
        </section>
      </div>
    </DeskPage>
  );
}

function TermTable({ terms }: { terms: TermView[] }) {
  return (
    <Table caption="terms of the school, the latest first">
      <TableHead>
        <tr>
          <HeadCell>term</HeadCell>
          <HeadCell>first day</HeadCell>
          <HeadCell>last day</HeadCell>
          <HeadCell align="right">sections</HeadCell>
          <HeadCell>
            <span className="sr-only">change</span>
          </HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        {terms.map(({ termId, name, startsOn, endsOn, sectionCount, when }) => (
          <tr key={termId}>
            <RowHead>
              {name}
              {when === 'now' ? <span className="ml-2 text-label font-[480] text-ink-2">now</span> : null}
            </RowHead>
            <Cell>{sayDay(startsOn)}</Cell>
            <Cell>{sayDay(endsOn)}</Cell>
            <Cell align="right">{sectionCount}</Cell>
            <Cell align="right">
              <Link className="link" href={`/school/terms/${termId}`} aria-label={`change ${name}`}>
                change
              </Link>
            </Cell>
          </tr>
        ))}
      </TableBody>
    </Table>
  );
}
