import { LinkButton } from '@/components/ui/link-button';

interface PagesProps {
  page: number;
  pageCount: number;
  hrefOf: (page: number) => string;
}

/** The way through a list of more than one page. */
export function Pages({ page, pageCount, hrefOf }: PagesProps) {
  if (pageCount < 2) return null;
  return (
    <nav aria-label="pages" className="mt-4 flex items-center gap-4 print:hidden">
      {page > 1 ? (
        <LinkButton size="small" href={hrefOf(page - 1)}>
          before
        </LinkButton>
      ) : null}
      <span className="tnum text-label text-ink-2">
        page {page} of {pageCount}
      </span>
      {page < pageCount ? (
        <LinkButton size="small" href={hrefOf(page + 1)}>
          next
        </LinkButton>
      ) : null}
    </nav>
  );
}
