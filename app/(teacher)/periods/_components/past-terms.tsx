import type { SectionListView } from '@/lib/data/sections/list-sections';
import { SectionTable } from './section-table';

/** Past terms, folded away. */
export function PastTerms({ sections }: { sections: readonly SectionListView[] }) {
  return (
    <details className="mt-8">
      <summary className="inline-flex min-h-11 items-center gap-2 text-text font-[620]">
        past terms
        <span className="font-[480] text-ink-2">
          {sections.length === 1 ? 'one section' : `${sections.length} sections`}
        </span>
      </summary>
      <SectionTable caption="sections of past terms, the latest first" sections={sections} withTerm />
    </details>
  );
}
