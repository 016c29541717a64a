import Link from 'next/link';
import { Cell, HeadCell, RowHead, Table, TableBody, TableHead } from '@/components/table/table';
import type { VariantListView } from '@/lib/data/practicals/list-variants';
import type { PublishedOriginal, VariantView } from '@/lib/data/practicals/load-variants';
import type { Unit } from '@/lib/length';
import type { CutList } from '@/lib/scoring/rubric-form';
import { PricesCell } from './prices-cell';
import { SizesOfList } from './sizes-of-list';
import { VariantDrawing } from './variant-drawing';

interface VariantTableProps {
  list: VariantListView;
  original: PublishedOriginal;
}

/** The original and its variants, on one scale: sizes, what is published, whose prices they have, which periods have them. */
export function VariantTable({ list, original }: VariantTableProps) {
  const { practicalId, unit, variants, periods } = list;
  const cutList = original.task.cutList;
  return (
    <Table caption="the original and its variants">
      <TableHead>
        <tr>
          <HeadCell>practical</HeadCell>
          <HeadCell className="w-56 max-lg:hidden">pieces</HeadCell>
          <HeadCell className="max-md:hidden">sizes</HeadCell>
          <HeadCell>given to</HeadCell>
          <HeadCell className="max-sm:hidden">prices</HeadCell>
        </tr>
      </TableHead>
      <TableBody>
        <tr>
          <NameCell href={`/practicals/${practicalId}`} name="original" state={`version ${original.number}`}>
            <SizesUnder original={cutList} variant={cutList} unit={unit} />
          </NameCell>
          <DrawingCell original={cutList} variant={cutList} />
          <SizesCell original={cutList} variant={cutList} unit={unit} />
          <Cell className="pt-3 align-top">{sayPeriods(periods)}</Cell>
          <Cell className="pt-3 align-top max-sm:hidden">its own</Cell>
        </tr>
        {variants.map((variant) => (
          <VariantRow key={variant.practicalId} variant={variant} original={original} unit={unit} />
        ))}
      </TableBody>
    </Table>
  );
}

interface VariantRowProps {
  variant: VariantView;
  original: PublishedOriginal;
  unit: Unit;
}

function VariantRow({ variant, original, unit }: VariantRowProps) {
  const { cutList } = original.task;
  return (
    <tr>
      <NameCell href={`/practicals/${variant.practicalId}`} name={variant.name} state={stateOf(variant)}>
        <SizesUnder original={cutList} variant={variant.cutList} unit={unit} />
        <div className="mt-1 text-label font-[440] sm:hidden">
          prices: <PricesCell variant={variant} original={original} unit={unit} />
        </div>
      </NameCell>
      <DrawingCell original={cutList} variant={variant.cutList} />
      <SizesCell original={cutList} variant={variant.cutList} unit={unit} />
      <Cell className="pt-3 align-top">{sayPeriods(variant.periods)}</Cell>
      <Cell className="pt-3 align-top max-sm:hidden">
        <PricesCell variant={variant} original={original} unit={unit} />
      </Cell>
    </tr>
  );
}

interface NameCellProps {
  href: string;
  name: string;
  state: string;
  children?: React.ReactNode;
}

function NameCell({ href, name, state, children }: NameCellProps) {
  return (
    <RowHead className="align-top whitespace-nowrap">
      <Link className="link inline-block py-1 font-title text-lead font-[620]" href={href}>
        {name}
      </Link>
      <span className="block text-label font-[440] text-ink-2">{state}</span>
      {children}
    </RowHead>
  );
}

function DrawingCell({ original, variant }: { original: CutList; variant: CutList | null }) {
  return (
    <Cell className="align-top max-lg:hidden">
      {variant ? <VariantDrawing original={original} variant={variant} width={190} height={96} /> : null}
    </Cell>
  );
}

interface SizesProps {
  original: CutList;
  variant: CutList | null;
  unit: Unit;
}

/** On a phone the sizes stand below the name. */
function SizesUnder({ original, variant, unit }: SizesProps) {
  if (!variant) return null;
  return (
    <div className="mt-1 text-label font-[440] md:hidden">
      <SizesOfList original={original} variant={variant} unit={unit} />
    </div>
  );
}

function SizesCell({ original, variant, unit }: SizesProps) {
  return (
    <Cell className="pt-3 align-top max-md:hidden">
      {variant ? (
        <SizesOfList original={original} variant={variant} unit={unit} />
      ) : (
        'Some of its sizes cannot be read yet.'
      )}
    </Cell>
  );
}

function sayPeriods(periods: readonly { period: string }[]) {
  if (periods.length === 0) return <span className="text-ink-2">no period</span>;
  const names = [...new Set(periods.map(({ period }) => period))];
  return `${names.length === 1 ? 'period' : 'periods'} ${names.join(', ')}`;
}

function stateOf({ published, changed, archived }: VariantView): string {
  if (archived) return published ? `version ${published.number}, put away` : 'draft, put away';
  if (!published) return 'draft';
  return changed ? `version ${published.number}, draft changed` : `version ${published.number}`;
}
