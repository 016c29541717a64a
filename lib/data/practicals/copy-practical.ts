import 'server-only';
import { selectDraft, selectPractical, selectVersion } from '@/db/queries/practicals';
import { may } from '@/lib/auth/policy';
import { copyPracticalInput } from '@/lib/contracts/practicals';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { draftOf } from '@/lib/practicals/draft-of';
import { type Context, defineVerb } from '../verb';
import { type PracticalSource, writePractical } from './new-practical';
import { practicalSubject } from './practical-subject';
import { storedDraft, storedVersion } from './stored';

const LONGEST_TITLE = 120;

/** A copy of one's own practical as it stands, or of what the department has published; prices and all. */
export const copyPractical = defineVerb({
  action: 'practical.copy',
  input: copyPracticalInput,
  async run(context): Promise<{ practicalId: string }> {
    const { input, log } = context;
    const source = input.versionId ? await versionSource(context) : await draftSource(context);
    const title = source.own ? `${source.draft.title.slice(0, LONGEST_TITLE - 5)}, copy` : source.draft.title;
    const practicalId = await writePractical(context, { ...source.draft, title }, source.taken);
    await log({
      subjectKind: 'practical',
      subjectId: practicalId,
      details: { copied: title, fromPractical: input.practicalId, fromVersion: input.versionId },
    });
    return { practicalId };
  },
});

type Input = Context<{ practicalId: string; versionId: string | null }>;
type Source = { draft: PracticalDraft; own: boolean; taken: PracticalSource | null };

async function draftSource({ actor, input, tx, found, authorize, refuse }: Input): Promise<Source> {
  const row = found(await selectPractical(tx, actor.schoolId, input.practicalId));
  authorize(practicalSubject(row));
  if (!may(actor, 'practical.change', practicalSubject(row))) {
    refuse('not_found', 'Only what the department has published can be copied.');
  }
  const draft = storedDraft(found(await selectDraft(tx, actor.schoolId, input.practicalId)).content);
  return { draft: { ...draft, title: draft.title.trim() || row.title }, own: true, taken: null };
}

async function versionSource({ actor, input, tx, found, authorize }: Input): Promise<Source> {
  const row = found(await selectVersion(tx, actor.schoolId, input.versionId ?? ''));
  authorize(practicalSubject(row));
  found(row.practicalId === input.practicalId ? row : null);
  const { task, form } = storedVersion(row);
  const own = row.ownerId === actor.personId;
  return {
    draft: draftOf(task, form),
    own,
    taken: { versionId: row.versionId, kind: own ? 'copy' : 'adopted' },
  };
}
