import 'server-only';
import type { z } from 'zod';
import { insertPublication, insertResults } from '@/db/queries/publications';
import { lockSitting, selectSitting, updateSitting } from '@/db/queries/sittings';
import { publishInput } from '@/lib/contracts/sittings';
import { sectionSubject } from '../sections/section-view';
import { type Context, defineVerb } from '../verb';
import {
  asTold,
  countChanges,
  type Gathered,
  type GatheredResult,
  gatherResults,
  judgeAll,
} from './gather-results';

export interface PublishedView {
  sectionId: string;
  number: number;
  scored: number;
  notRead: number;
  changed: number;
}

type Publish = Context<z.output<typeof publishInput>>;

/**
 * Tells every student of a sitting the result, in one transaction with the log entry. A later publication corrects
 * the one before; where nothing has changed there is none. An open conflict, unread sizes without the teacher's word,
 * and late predictions without a decision hold it up.
 */
export const publishSitting = defineVerb({
  action: 'sitting.publish',
  input: publishInput,
  async run(context): Promise<PublishedView> {
    const { actor, input, tx, authorize, found, refuse, log } = context;
    const { schoolId, personId } = actor;
    await lockSitting(tx, schoolId, input.sittingId);
    const sitting = found(await selectSitting(tx, schoolId, input.sittingId));
    authorize(sectionSubject(sitting));
    const gathered = await gatherResults(tx, sitting);
    if (gathered.seen !== input.seen) {
      refuse('stale', 'Something has changed since you looked: look at what goes out again.');
    }
    const results = decide(context, gathered);
    const changed = countChanges(sitting, gathered.latest, results);
    if (changed === 0) refuse('conflict', nothingChanged(gathered));
    const { rubricVersionId, sittingId } = sitting;
    const number = (gathered.latest?.publication.number ?? 0) + 1;
    const publicationId = await insertPublication(tx, {
      schoolId,
      sittingId,
      number,
      rubricVersionId,
      publishedBy: personId,
    });
    await insertResults(
      tx,
      results.map((result) => ({ schoolId, publicationId, ...asTold(result) })),
    );
    await updateSitting(tx, schoolId, sittingId, { state: 'published' });
    const counts = { number, changed, ...count(results) };
    const { withoutUnread, lateLocks } = input;
    await log({
      subjectKind: 'sitting',
      subjectId: sittingId,
      details: { ...counts, publicationId, rubricVersionId, withoutUnread, lateLocks: lateLocks ?? null },
    });
    return { sectionId: sitting.sectionId, ...counts };
  },
});

/** The results as the teacher decided, or a refusal that names what is still open. */
function decide({ input, refuse, refuseFields }: Publish, gathered: Gathered): GatheredResult[] {
  const late = gathered.attempts.filter(({ recorded }) => recorded.own?.late).length;
  if (late > 0 && !input.lateLocks) {
    refuseFields({
      lateLocks: [
        `${late === 1 ? 'One prediction was' : `${late} predictions were`} locked late. Choose whether they count.`,
      ],
    });
  }
  const results = judgeAll(gathered, input.lateLocks === 'count');
  if (results.length === 0) refuse('conflict', 'There is no student in this sitting.');
  const conflicts = results.filter(({ open }) => open === 'conflict');
  if (conflicts.length > 0) {
    refuse(
      'conflict',
      `${names(conflicts)}: two readings stand against each other. Settle them at the bench first.`,
    );
  }
  const unread = results.filter(({ open }) => open !== null);
  if (unread.length > 0 && !input.withoutUnread) {
    refuseFields({
      withoutUnread: [
        `${names(unread)}: not read to the end. Read the rest, give a standing, or publish without them.`,
      ],
    });
  }
  return results;
}

function names(results: readonly GatheredResult[]): string {
  const [first, second, ...others] = results.map(({ row }) => `${row.givenName} ${row.familyName}`.trim());
  if (!second) return first ?? '';
  return others.length > 0 ? `${first}, ${second} and ${others.length} more` : `${first} and ${second}`;
}

function count(results: readonly GatheredResult[]): { scored: number; notRead: number } {
  return {
    scored: results.filter(({ status }) => status === 'scored').length,
    notRead: results.filter(({ status }) => status === 'not read').length,
  };
}

function nothingChanged({ latest }: Gathered): string {
  return latest
    ? `Nothing changed since publication ${latest.publication.number}: there is nothing new to tell.`
    : 'There is nothing to publish yet.';
}
