import { eq } from 'drizzle-orm';
import type { Transaction } from '@/db/client';
import { accommodationReasons, accommodations, sections } from '@/db/schema';
import { rebuildSheets } from '@/lib/data/rounds/rebuild-sheets';
import type { Modification } from '@/lib/scoring/modification';
import type { SeededSchool, SeededSection, SeededStudent } from './people';
import { morningOf } from './practicals';
import type { Random } from './random';
import type { SeededSitting } from './sittings';

interface SeedAccommodation {
  section: SeededSection;
  student: SeededStudent | undefined;
  sittingId: string | null;
  day: string;
  modification: Modification;
  reason: string;
}

/** A student who is priced by wider bands all term, from before the first sitting. */
export async function seedTermAccommodation(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
): Promise<void> {
  const section = school.sections.get('cf3');
  if (!section) return;
  await insert(tx, random, school, {
    section,
    student: section.students[6],
    sittingId: null,
    day: '2026-08-28',
    modification: {
      format: 1,
      widen: { num: 3, den: 2 },
      excused: [],
      checks: [{ label: 'surface', lose: null }],
    },
    reason: 'Low vision: reads a rule through a magnifier. Agreed with the support office for the fall term.',
  });
}

/** A student with a line less to cut in one sitting; what the bench has recorded is priced anew. */
export async function seedSittingAccommodation(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  sitting: SeededSitting,
): Promise<void> {
  if (sitting.plan.section !== 'cf3' || sitting.plan.practical !== 'desk-caddy') return;
  const attempt = sitting.attempts[17];
  await insert(tx, random, school, {
    section: sitting.section,
    student: attempt?.student,
    sittingId: sitting.id,
    day: '2026-11-12',
    modification: {
      format: 1,
      widen: { num: 1, den: 1 },
      excused: [{ lineId: 'divider', axis: null }],
      checks: [],
    },
    reason: 'Wrist in a splint since 9 November: no crosscuts of short pieces, so the dividers are left out.',
  });
  if (attempt) await rebuildSheets(tx, school.id, [attempt.id]);
}

async function insert(
  tx: Transaction,
  random: Random,
  school: SeededSchool,
  { section, student, sittingId, day, modification, reason }: SeedAccommodation,
): Promise<void> {
  const [row] = await tx
    .select({ termId: sections.termId })
    .from(sections)
    .where(eq(sections.id, section.id));
  if (!row || !student) throw new Error('nobody to modify a rubric for');
  const made = { schoolId: school.id, id: random.uuid() };
  await tx.insert(accommodations).values({
    ...made,
    ...{ studentId: student.id, departmentId: school.departmentId, termId: row.termId, sittingId },
    ...{ modification, madeBy: section.teacherId, madeAt: morningOf(day) },
  });
  await tx.insert(accommodationReasons).values({
    ...{ schoolId: school.id, accommodationId: made.id, reason },
    ...{ writtenBy: section.teacherId, writtenAt: morningOf(day) },
  });
}
