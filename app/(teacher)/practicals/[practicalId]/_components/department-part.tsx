'use client';

import type { RefObject } from 'react';
import { PhraseList } from '@/components/ui/phrase-list';
import { TextAreaField } from '@/components/ui/text-area-field';
import { LONGEST_REASON } from '@/lib/contracts/practicals';
import type { DepartmentRubric } from '@/lib/data/practicals/department-rubric';
import { departmentDifferences } from '@/lib/practicals/department-differences';
import type { ParsedDraft } from '@/lib/practicals/parse-draft';

interface DepartmentPartProps {
  department: DepartmentRubric;
  parsed: Extract<ParsedDraft, { ok: true }>;
  /** What was said of the version before. */
  given: string;
  reasonField: RefObject<HTMLTextAreaElement | null>;
}

/** Where the version differs from the department’s, and room to say why. It asks nothing of a version that does not. */
export function DepartmentPart({ department, parsed, given, reasonField }: DepartmentPartProps) {
  const { same, sentences } = departmentDifferences(department, { ...parsed, label: 'this version' });
  if (same) return null;
  return (
    <div className="mb-4">
      <h3 className="font-[640]">Where it differs from the department’s rubric</h3>
      <PhraseList phrases={sentences} unit={parsed.task.unit} className="mt-1" />
      <TextAreaField
        ref={reasonField}
        label="why"
        optional
        hint="Your head reads the differences, and this beside them."
        rows={3}
        maxLength={LONGEST_REASON}
        defaultValue={given}
        className="mt-3"
      />
    </div>
  );
}
