import 'server-only';
import { selectSitting } from '@/db/queries/sittings';
import { sittingIdInput } from '@/lib/contracts/sittings';
import type { Points } from '@/lib/scoring';
import { sectionSubject } from '../sections/section-view';
import { defineVerb } from '../verb';
import { countChanges, type GatheredResult, gatherResults, judgeAll } from './gather-results';

export interface StudentName {
  studentId: string;
  familyName: string;
  givenName: string;
}

export interface PublicationPreview {
  sittingId: string;
  title: string;
  sectionName: string;
  period: string;
  versionNumber: number;
  /** The number that the next publication gets. */
  number: number;
  lastPublishedAt: string | null;
  /** Results that would differ from the latest publication; null before the first. */
  changed: number | null;
  scored: number;
  zero: number;
  absent: StudentName[];
  excused: StudentName[];
  /** Nothing was read. */
  unread: StudentName[];
  /** Something was read, and something not. */
  incomplete: StudentName[];
  conflicts: StudentName[];
  withBonus: number;
  /** Locked after the bench had begun, without a receipt; `bonus` is what it would earn. */
  late: (StudentName & { predicted: Points | null; bonus: Points })[];
  seen: string;
}

/** What publishing a sitting now would tell, and what stands in its way. Brings the sheets up to date. */
export const previewPublication = defineVerb({
  action: 'sitting.publish',
  input: sittingIdInput,
  async run({ actor, input, tx, authorize, found, logView }): Promise<PublicationPreview> {
    const sitting = found(await selectSitting(tx, actor.schoolId, input.sittingId));
    authorize(sectionSubject(sitting));
    const gathered = await gatherResults(tx, sitting);
    const results = judgeAll(gathered, true);
    const without = judgeAll(gathered, false);
    const { latest, seen } = gathered;
    await logView(
      {
        subjectKind: 'sitting',
        subjectId: sitting.sittingId,
        details: { students: gathered.attempts.length },
      },
      'sitting.read',
    );
    const changed = Math.min(...[results, without].map((judged) => countChanges(sitting, latest, judged)));
    return {
      sittingId: sitting.sittingId,
      title: sitting.title,
      sectionName: sitting.sectionName,
      period: sitting.period,
      versionNumber: sitting.versionNumber,
      number: (latest?.publication.number ?? 0) + 1,
      lastPublishedAt: latest?.publication.publishedAt.toISOString() ?? null,
      changed: latest ? changed : null,
      ...countResults(results),
      late: results.flatMap((result, index) =>
        gathered.attempts[index]?.recorded.own?.late
          ? [{ ...nameOf(result), predicted: result.predictedPoints, bonus: result.bonusPoints }]
          : [],
      ),
      seen,
    };
  },
});

function nameOf({ row: { studentId, familyName, givenName } }: GatheredResult): StudentName {
  return { studentId, familyName, givenName };
}

function countResults(results: readonly GatheredResult[]) {
  const named = (is: (result: GatheredResult) => boolean) => results.filter(is).map(nameOf);
  return {
    scored: results.filter(({ status }) => status === 'scored').length,
    zero: results.filter(({ status }) => status === 'zero').length,
    absent: named(({ status }) => status === 'absent'),
    excused: named(({ status }) => status === 'excused'),
    unread: named(({ open }) => open === 'unread'),
    incomplete: named(({ open }) => open === 'unread sizes'),
    conflicts: named(({ open }) => open === 'conflict'),
    withBonus: results.filter(({ bonusPoints }) => bonusPoints > 0).length,
  };
}
