import 'server-only';
import { importPracticalInput } from '@/lib/contracts/versions';
import { draftOf } from '@/lib/practicals/draft-of';
import { type FileProblem, readPracticalFile } from '@/lib/practicals/read-practical-file';
import type { FieldErrors } from '@/lib/result';
import { defineVerb } from '../verb';
import { writePractical } from './new-practical';

/** A practical of one's own from a file, with its draft; nothing is made unless all of the file can be used. */
export const importPractical = defineVerb({
  action: 'practical.create',
  input: importPracticalInput,
  async run(context): Promise<{ practicalId: string }> {
    const { actor, input, authorize, refuseFields, log } = context;
    authorize({ schoolId: actor.schoolId });
    const read = readPracticalFile(input.text);
    if (!read.ok) return refuseFields(byPath(read.problems));
    const practicalId = await writePractical(context, draftOf(read.task, read.form));
    await log({ subjectKind: 'practical', subjectId: practicalId, details: { imported: read.task.title } });
    return { practicalId };
  },
});

function byPath(problems: readonly FileProblem[]): FieldErrors {
  const fields: FieldErrors = {};
  for (const { path, line, column, reason } of problems) {
    fields[path] = [...(fields[path] ?? []), `Line ${line}, column ${column}: ${reason}`];
  }
  return fields;
}
