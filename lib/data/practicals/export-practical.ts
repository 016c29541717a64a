import 'server-only';
import { selectDraft, selectPractical } from '@/db/queries/practicals';
import { may } from '@/lib/auth/policy';
import { exportPracticalInput } from '@/lib/contracts/versions';
import { fieldName } from '@/lib/practicals/field-names';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { practicalFileName, writePracticalFile } from '@/lib/practicals/practical-file';
import type { Task } from '@/lib/practicals/task';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { type Context, defineVerb } from '../verb';
import { loadVersions } from './load-versions';
import { practicalSubject } from './practical-subject';
import { storedDraft, storedVersion } from './stored';

export interface PracticalFile {
  fileName: string;
  text: string;
}

const MOST_NAMED = 6;

/** A published version as a file, or one's own draft once every field of it can be read. */
export const exportPractical = defineVerb({
  action: 'version.read',
  input: exportPracticalInput,
  async run(context): Promise<PracticalFile> {
    const { input, log } = context;
    const { task, form } =
      input.version === null ? await draftOf(context) : await versionOf(context, input.version);
    const fileName = practicalFileName(task.title, input.version);
    await log({
      subjectKind: 'practical',
      subjectId: input.practicalId,
      details: { exported: task.title, version: input.version ?? 'draft', file: fileName },
    });
    return { fileName, text: writePracticalFile(task, form) };
  },
});

type Exporting = Context<{ practicalId: string }>;
type Authored = { task: Task; form: RubricForm };

async function versionOf(context: Exporting, number: number): Promise<Authored> {
  const { versions } = await loadVersions(context, context.input.practicalId);
  return storedVersion(context.found(versions.find(({ row }) => row.number === number)).row);
}

async function draftOf({ actor, input, tx, found, refuse }: Exporting): Promise<Authored> {
  const row = found(await selectPractical(tx, actor.schoolId, input.practicalId));
  found(may(actor, 'practical.change', practicalSubject(row)) ? row : null);
  const draft = found(await selectDraft(tx, actor.schoolId, row.id));
  const parsed = parseDraft(storedDraft(draft.content));
  if (parsed.ok) return parsed;
  const names = Object.keys(parsed.errors).map(fieldName);
  const more = names.length - MOST_NAMED;
  const named = `${names.slice(0, MOST_NAMED).join('; ')}${more > 0 ? `; and ${more} more` : ''}`;
  return refuse('invalid', `The draft cannot be written to a file yet. Put right: ${named}.`, {
    fields: parsed.errors,
  });
}
