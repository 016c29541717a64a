import 'server-only';
import { selectLatestVersion, selectVersion } from '@/db/queries/practicals';
import { may } from '@/lib/auth/policy';
import { changesSince } from '@/lib/practicals/changes-since';
import type { Phrase } from '@/lib/practicals/compare-types';
import type { SourceKind } from '@/lib/practicals/take-over';
import type { Task } from '@/lib/practicals/task';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import type { Context } from '../verb';
import { practicalSubject } from './practical-subject';
import { storedVersion } from './stored';

/** The version that a practical was taken from, and whether its original has moved on. */
export interface SourceView {
  kind: SourceKind;
  practicalId: string;
  /** Whose it is, when it is a colleague's. */
  ownerName: string | null;
  title: string;
  versionId: string;
  number: number;
  task: Task;
  form: RubricForm;
  /** The original can still be looked at: one's own, or on offer. */
  isOpen: boolean;
  newest: NewerVersion | null;
}

export interface NewerVersion {
  versionId: string;
  number: number;
  /** What it changes of the version that was taken. */
  changes: Phrase[];
}

type Reading = Pick<Context<unknown>, 'actor' | 'tx'>;
type Taken = { copiedFromVersionId: string | null; sourceKind: SourceKind | null };

export async function readSource({ actor, tx }: Reading, practical: Taken): Promise<SourceView | null> {
  const { copiedFromVersionId, sourceKind } = practical;
  if (!copiedFromVersionId || !sourceKind) return null;
  const source = await selectVersion(tx, actor.schoolId, copiedFromVersionId);
  if (!source) return null;
  const { task, form, rubric } = storedVersion(source);
  const isOpen = may(actor, 'version.read', practicalSubject(source));
  const latest = isOpen ? await selectLatestVersion(tx, actor.schoolId, source.practicalId) : undefined;
  const isNewer = latest !== undefined && latest.number > source.number;
  return {
    kind: sourceKind,
    practicalId: source.practicalId,
    ownerName: source.ownerId === actor.personId ? null : source.ownerName,
    title: task.title,
    versionId: source.versionId,
    number: source.number,
    ...{ task, form, isOpen },
    newest: isNewer
      ? {
          versionId: latest.id,
          number: latest.number,
          changes: changesSince(
            { task, form, rubric, number: source.number },
            { ...storedVersion(latest), number: latest.number },
          ),
        }
      : null,
  };
}
