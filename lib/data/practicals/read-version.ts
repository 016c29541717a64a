import 'server-only';
import { selectVersion } from '@/db/queries/practicals';
import { readVersionInput } from '@/lib/contracts/practicals';
import type { Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { defineVerb } from '../verb';
import { storedVersion } from './stored';
import { loadVersionSubject } from './version-subject';

export interface VersionView {
  versionId: string;
  practicalId: string;
  number: number;
  ownerName: string;
  publishedAt: string;
  task: Task;
  form: RubricForm;
  rubric: Rubric;
}

export const readVersion = defineVerb({
  action: 'version.read',
  input: readVersionInput,
  async run({ actor, input, tx, found, authorize }): Promise<VersionView> {
    const row = found(await selectVersion(tx, actor.schoolId, input.versionId));
    authorize(await loadVersionSubject(tx, row));
    const { versionId, practicalId, number, ownerName, publishedAt } = row;
    return {
      versionId,
      practicalId,
      number,
      ownerName,
      publishedAt: publishedAt.toISOString(),
      ...storedVersion(row),
    };
  },
});
