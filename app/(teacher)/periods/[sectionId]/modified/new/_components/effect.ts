import type { DeskSitting } from '@/lib/data/accommodations/read-accommodation-desk';
import { type Points, scoreAttempt } from '@/lib/scoring';
import { type Modification, modifyAttempt, modifyRubric } from '@/lib/scoring/modification';

/** A recorded attempt as everybody is priced, and under the modification. */
export interface Effect {
  key: string;
  title: string;
  attemptNumber: number;
  complete: boolean;
  before: Points | null;
  after: Points | null;
  total: Points;
  /** Another modified rubric, of this sitting alone, prices it. */
  ownStands: boolean;
}

/** What a modification does to what is recorded; scores without the bonus of a prediction. */
export function effectsOf(
  sittings: readonly DeskSitting[],
  modification: Modification,
  ownSittingIds: readonly (string | null)[],
): Effect[] {
  return sittings.flatMap(({ sittingId, title, rubric, attempts }) =>
    attempts.map(({ attemptNumber, recorded }) => {
      const before = scoreAttempt(rubric, recorded);
      const after = scoreAttempt(
        modifyRubric(rubric, modification),
        modifyAttempt(rubric, recorded, modification),
      );
      return {
        key: `${sittingId} ${attemptNumber}`,
        title,
        attemptNumber,
        complete: after.complete,
        before: before.provisional,
        after: after.provisional,
        total: before.total,
        ownStands: ownSittingIds.includes(sittingId),
      };
    }),
  );
}
