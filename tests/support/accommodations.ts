import type { Actor } from '@/lib/auth/actor';
import { makeAccommodation } from '@/lib/data/accommodations/make-accommodation';
import type { Modification } from '@/lib/scoring/modification';
import { value } from './answers';
import { ownerSql } from './database';
import type { RoundStage } from './round-stage';

/** Nowhere else in a test: whatever carries it has told the reason. */
export const REASON = 'Reads a rule with a magnifier; wrist in a splint until spring.';

/** A factor that no rubric and no reading has, so that it can be looked for in what is shown. */
export const WIDER: Modification = { format: 1, widen: { num: 9, den: 4 }, excused: [], checks: [] };

type Given = Partial<{
  student: Actor;
  sittingId: string | null;
  modification: Modification;
  reason: string;
  replaces: string | null;
  by: Actor;
  sectionId: string;
}>;

/** What the form of a modified rubric sends: for the first student and the sitting of the stage, unless told otherwise. */
export function accommodationOf(stage: RoundStage, given: Given = {}) {
  return {
    sectionId: given.sectionId ?? stage.sectionId,
    studentId: (given.student ?? stage.students[0]).personId,
    sittingId: given.sittingId === undefined ? stage.sittingId : given.sittingId,
    replaces: given.replaces ?? null,
    modification: given.modification ?? WIDER,
    reason: given.reason ?? REASON,
  };
}

/** Modifies the rubric for a student; gives the id. */
export async function modifyFor(stage: RoundStage, given: Given = {}): Promise<string> {
  const made = await makeAccommodation(given.by ?? stage.teacher, accommodationOf(stage, given));
  return value(made).accommodationId;
}

/** All that is stored of modified rubrics; the same before and after a refusal. */
export function storedAccommodations(school: { id: string }) {
  return ownerSql()`
    select a.id, a.student_id, a.sitting_id, a.modification, a.ended_by, a.ended_at is not null as ended, r.reason
    from accommodations a join accommodation_reasons r on r.accommodation_id = a.id
    where a.school_id = ${school.id} order by a.made_at, a.id`;
}

/** The sheet of an attempt at the bench as it is stored, with the modified rubric that priced it. */
export async function pricedSheet(attemptId: string) {
  const [row] = await ownerSql()<
    {
      score: number | null;
      total: number;
      lost: number;
      accommodation_id: string | null;
      recorded: unknown;
    }[]
  >`
    select score_points as score, total_points as total, lost_points as lost, accommodation_id, recorded
    from score_sheets where attempt_id = ${attemptId} and side = 'bench'`;
  return row;
}
