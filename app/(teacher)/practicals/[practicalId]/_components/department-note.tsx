'use client';

import { LocalTime } from '@/components/ui/local-time';
import { PhraseList } from '@/components/ui/phrase-list';
import { Heading } from '@/components/ui/titles';
import type { DepartmentRubric } from '@/lib/data/practicals/department-rubric';
import type { PracticalView } from '@/lib/data/practicals/read-practical';
import { departmentDifferences } from '@/lib/practicals/department-differences';
import { useEditor } from './editor-context';

/** Which rubric the department approved for this task, and where the draft differs from it. */
export function DepartmentNote({ view, department }: { view: PracticalView; department: DepartmentRubric }) {
  const { parsed } = useEditor();
  const own = department.practicalId === view.practicalId;
  const differences = parsed.ok
    ? departmentDifferences(department, { ...parsed, label: 'your draft' })
    : null;
  return (
    <section aria-labelledby="department-heading">
      <Heading id="department-heading">The department’s rubric</Heading>
      <p className="mt-1 text-label">
        {own ? 'Your' : `${department.ownerName}’s`} version {department.number}, approved by{' '}
        {department.approvedBy} on <LocalTime at={department.approvedAt} style="day" />.
        {differences?.same ? ' Your draft prices every reading alike.' : ''}
      </p>
      {differences && !differences.same ? (
        <details className="mt-1 text-label">
          <summary className="cursor-pointer py-1.5 font-[640]">where your draft differs</summary>
          <PhraseList phrases={differences.sentences} unit={view.unit} />
          <p className="mt-2 text-ink-2">
            That is yours to decide. When you publish it, you can say why; your head reads both.
          </p>
        </details>
      ) : null}
    </section>
  );
}
