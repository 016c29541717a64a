import 'server-only';
import { z } from 'zod';
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

const replacedDraftSchema = z.strictObject({
  content: practicalDraftSchema,
  /** The version that the practical was taken from until then. */
  sourceVersionId: z.uuid(),
  /** The number of the version that was taken over. */
  takenNumber: z.int().min(1),
});

export type ReplacedDraft = z.infer<typeof replacedDraftSchema>;

/** The draft that gave way to a newer version of the original, if one did. */
export function storedReplaced(replaced: unknown): ReplacedDraft | null {
  return replaced === null ? null : replacedDraftSchema.parse(replaced);
}
