import 'server-only';
import { practicalDraftSchema } from '@/lib/practicals/draft';
import { taskSchema } from '@/lib/practicals/task';
import { rubricSchema } from '@/lib/scoring';
import { rubricFormSchema } from '@/lib/scoring/rubric-form-schema';

/** A stored draft; one that no longer fits the schema is a bug, and is thrown. */
export function storedDraft(content: unknown) {
  return practicalDraftSchema.parse(content);
}

/** A stored version's task, form and rubric. */
export function storedVersion(row: { task: unknown; form: unknown; rubric: unknown }) {
  return {
    task: taskSchema.parse(row.task),
    form: rubricFormSchema.parse(row.form),
    rubric: rubricSchema.parse(row.rubric),
  };
}
