import type { SectionListView } from '@/lib/data/sections/list-sections';
import { SectionTable } from './section-table';

/** Past terms, folded away. */
export function PastTerms({ sections }: { sections: readonly SectionListView[] }) {
  return (
    <details className="mt-8">
      <summary className="mb-2 py-2 marker:text-ink-2">
        <span className="link font-[620]">past terms</span>,{' '}
        {sections.length === 1 ? 'one section' : `${sections.length} sections`}
      </summary>
      <SectionTable caption="sections of past terms, the latest first" sections={sections} withTerm />
    </details>
  );
}
