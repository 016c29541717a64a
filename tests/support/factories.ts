import { randomUUID } from 'node:crypto';
import { draftOf } from '@/lib/practicals/draft-of';
import type { Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { ownerSql } from './database';
import { defaultForm, defaultRubric, defaultTask } from './rubrics';
import type { TestSchool } from './school';

export interface TestPractical {
  practicalId: string;
  versionId: string;
  task: Task;
  rubric: Rubric;
}

/** A practical of the teacher's with its version 1 published, and the same as its draft. */
export async function makePractical(
  school: TestSchool,
  ownerId: string,
  given: { task?: Task; rubric?: Rubric; form?: RubricForm } = {},
): Promise<TestPractical> {
  const sql = ownerSql();
  const task = given.task ?? defaultTask();
  const rubric = given.rubric ?? defaultRubric();
  const form = given.form ?? defaultForm(task.unit);
  const practicalId = randomUUID();
  const versionId = randomUUID();
  await sql`insert into practicals ${sql({
    school_id: school.id,
    id: practicalId,
    department_id: school.departmentId,
    owner_id: ownerId,
    title: task.title,
    unit: task.unit,
  })}`;
  await sql`
    insert into rubric_versions
      (school_id, id, practical_id, number, task, form, rubric, engine_version, published_by)
    values (${school.id}, ${versionId}, ${practicalId}, 1, ${sql.json({ ...task })}, ${sql.json(jsonOf(form))},
      ${sql.json(jsonOf(rubric))}, 1, ${ownerId})`;
  await sql`
    insert into practical_drafts (school_id, practical_id, content, revision, saved_by)
    values (${school.id}, ${practicalId}, ${sql.json(jsonOf(draftOf(task, form)))}, 1, ${ownerId})`;
  return { practicalId, versionId, task, rubric };
}

function jsonOf(value: object): Parameters<ReturnType<typeof ownerSql>['json']>[0] {
  return JSON.parse(JSON.stringify(value));
}

export interface TestSitting {
  sittingId: string;
  sectionId: string;
  /** The first attempt of each student, by person. */
  attempts: Map<string, string>;
}

/** The practical given to a section, with a first attempt for each of the students. */
export async function makeSitting(
  school: TestSchool,
  sectionId: string,
  practical: TestPractical,
  {
    openedBy,
    studentIds,
    published = false,
  }: { openedBy: string; studentIds: string[]; published?: boolean },
): Promise<TestSitting> {
  const sql = ownerSql();
  const sittingId = randomUUID();
  await sql`insert into sittings ${sql({
    school_id: school.id,
    id: sittingId,
    section_id: sectionId,
    practical_id: practical.practicalId,
    rubric_version_id: practical.versionId,
    state: published ? 'published' : 'open',
    opened_by: openedBy,
  })}`;
  const attempts = new Map<string, string>();
  for (const studentId of studentIds)
    attempts.set(studentId, await makeAttempt(school, sittingId, studentId));
  return { sittingId, sectionId, attempts };
}

export async function makeAttempt(
  school: TestSchool,
  sittingId: string,
  studentId: string,
  number = 1,
): Promise<string> {
  const sql = ownerSql();
  const id = randomUUID();
  await sql`insert into attempts ${sql({
    school_id: school.id,
    id,
    sitting_id: sittingId,
    student_id: studentId,
    number,
  })}`;
  return id;
}

export async function enroll(school: TestSchool, sectionId: string, studentId: string): Promise<void> {
  const sql = ownerSql();
  await sql`insert into enrollments ${sql({
    school_id: school.id,
    section_id: sectionId,
    student_id: studentId,
    joined_on: '2026-01-12',
  })}`;
}

/** An aide's days in a section, counted from today; by default yesterday to tomorrow. */
export async function giveAide(
  school: TestSchool,
  sectionId: string,
  personId: string,
  { from = -1, to = 1 }: { from?: number; to?: number } = {},
): Promise<void> {
  await ownerSql()`
    insert into section_staff (school_id, section_id, person_id, duty, from_day, to_day)
    values (${school.id}, ${sectionId}, ${personId}, 'aide', current_date + ${from}::int, current_date + ${to}::int)`;
}
