import { randomUUID } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { ACTIONS, mayEver } from '@/lib/auth/policy';
import { endAccommodation } from '@/lib/data/accommodations/end-accommodation';
import { readReason } from '@/lib/data/accommodations/read-reason';
import { exportGrades, exportSizes } from '@/lib/data/gradebook/export-files';
import { readGradebook } from '@/lib/data/gradebook/read-gradebook';
import { listTasks } from '@/lib/data/own/list-tasks';
import { readResult } from '@/lib/data/own/read-result';
import { readTask } from '@/lib/data/own/read-task';
import { listRounds } from '@/lib/data/rounds/list-rounds';
import { readInHand } from '@/lib/data/rounds/read-in-hand';
import { readRound } from '@/lib/data/rounds/read-round';
import { takeInHand } from '@/lib/data/rounds/take-in-hand';
import { listPeople } from '@/lib/data/school/list-people';
import { readLog } from '@/lib/data/school/read-log';
import { readPerson } from '@/lib/data/school/read-person';
import { listSections } from '@/lib/data/sections/list-sections';
import { readSectionRoster } from '@/lib/data/sections/read-roster';
import { listSittings } from '@/lib/data/sittings/list-sittings';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import { readSitting } from '@/lib/data/sittings/read-sitting';
import { explainScore } from '@/lib/practicals/explain-score';
import type { Result } from '@/lib/result';
import { modifyRubric } from '@/lib/scoring/modification';
import type { Listening } from '@/scripts/services/http';
import { startS3 } from '@/scripts/services/s3';
import { modifyFor, REASON, WIDER } from '@/tests/support/accommodations';
import { code, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { tenantTables } from '@/tests/support/every-table';
import { lockPrediction, markPieces, readingsOf } from '@/tests/support/mark-pieces';
import { push } from '@/tests/support/push-events';
import { eventOf, type RoundStage, stageRound } from '@/tests/support/round-stage';
import { makeActor } from '@/tests/support/school';

const KEYS = { accessKeyId: 'tests', secretAccessKey: 'a secret of the tests' };
const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/width': '2 1/16' };
const MODIFICATION = {
  ...WIDER,
  excused: [{ lineId: null, axis: 'thickness' as const }],
  checks: [{ label: 'square', lose: [0, 37] }],
};
/** How the product and its tables speak of it. */
const WORDS = /modif|accommod|excus|splint|magnifier|"lose":37/i;

let s3: Listening;
let folder: string;
let stage: RoundStage;
let plain: RoundStage;
let accommodationId: string;
/** Every band edge that only the modified rubric has. */
let widerEdges: string[];

/** Two classes alike: in one a student is priced by a modified rubric, in the other nobody is. */
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'trymark-never-shown-'));
  s3 = await startS3({ ...KEYS, port: 0, folder, bucket: 'trymark' });
  process.env.S3_ENDPOINT = `http://127.0.0.1:${s3.port}`;
  process.env.S3_BUCKET = 'trymark';
  process.env.S3_ACCESS_KEY_ID = KEYS.accessKeyId;
  process.env.S3_SECRET_ACCESS_KEY = KEYS.secretAccessKey;
  stage = await stageRound();
  plain = await stageRound();
  accommodationId = await modifyFor(stage, { modification: MODIFICATION });
  const edges = (rubric: typeof stage.practical.rubric) =>
    rubric.lines.flatMap(({ sizes }) => sizes.length.over.map(({ within }) => String(within)));
  const { rubric } = stage.practical;
  widerEdges = [...new Set(edges(modifyRubric(rubric, MODIFICATION)))];
  for (const each of [stage, plain]) await recordClass(each);
});

afterAll(async () => {
  await s3.close();
  await rm(folder, { recursive: true });
});

async function recordClass({ teacher, students, sittingId, attempts, practical }: RoundStage) {
  await lockPrediction(students[0], sittingId, attempts[0], practical.rubric, SHORT);
  await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
  await markPieces(teacher, sittingId, attempts[1], practical.rubric, SHORT);
}

async function publish({ teacher, sittingId }: RoundStage) {
  const { seen } = value(await previewPublication(teacher, { sittingId }));
  value(await publishSitting(teacher, { sittingId, seen, withoutUnread: true, lateLocks: 'count' }));
}

/** A whole answer, as it goes over the wire. */
const wire = (answers: Result<unknown>[]): string => JSON.stringify(answers.map(value));

/** Nothing of it in a payload: no word, no id, no wider band, no other price. */
function expectNothingOf(payload: string, { words = WORDS } = {}) {
  expect(payload).not.toMatch(words);
  expect(payload).not.toContain(accommodationId);
  for (const edge of widerEdges) expect(payload).not.toContain(edge);
  expect(payload.length).toBeGreaterThan(20);
}

/** The payload of one class with the names of ids exchanged for their order, to be laid beside the other's. */
function withoutIds(payload: string): string {
  const seen = new Map<string, number>();
  return payload
    .replaceAll(/[0-9a-f]{8}(?:-[0-9a-f]{4}){3}-[0-9a-f]{12}/g, (id) => {
      if (!seen.has(id)) seen.set(id, seen.size);
      return `id ${seen.get(id)}`;
    })
    .replaceAll(/\d{4}-\d\d-\d\dT[\d:.]+Z/g, 'a moment')
    .replaceAll(/"sequence":\d+/g, '"sequence":0');
}

const answersOfBench = async (actor: Actor, { sittingId, attempts, sectionId }: RoundStage) => {
  const deviceId = randomUUID();
  return [
    await readRound(actor, { sittingId }),
    await listRounds(actor, {}),
    await listSections(actor, {}),
    await takeInHand(actor, { sittingId, deviceId, attemptId: attempts[0] }),
    await readInHand(actor, { sittingId, deviceId }),
    await takeInHand(actor, { sittingId, deviceId, attemptId: null }),
    ...(actor.role === 'teacher' ? [await readSectionRoster(actor, { sectionId })] : []),
  ];
};

describe('a modified rubric is never shown', () => {
  it.each(['teacher', 'aide'] as const)(
    'at the bench to a %s: the whole round is that of a class without one',
    async (role) => {
      const round = (of: RoundStage) => readRound(of[role], { sittingId: of.sittingId });
      const payload = wire([await round(stage)]);
      expectNothingOf(payload);
      expect(JSON.parse(payload)[0].rubric).toEqual(stage.practical.rubric);
      const school = (of: RoundStage, text: string) => text.replaceAll(of.school.name, 'school');
      expect(withoutIds(school(stage, payload))).toBe(withoutIds(school(plain, wire([await round(plain)]))));
      expectNothingOf(wire(await answersOfBench(stage[role], stage)));
    },
  );

  it('to an aide by any verb that aides may use', async () => {
    expect(ACTIONS.filter((action) => mayEver('aide', action))).toEqual([
      'section.list',
      'sitting.list',
      'round.read',
      'round.record',
    ]);
    const { aide, sittingId, attempts } = stage;
    const other = eventOf(aide, attempts[1], { supersedes: [] });
    expectNothingOf(
      wire([
        ...(await answersOfBench(aide, stage)),
        await listSittings(aide, {}),
        await push(aide, sittingId, [{ ...other, cell: { ...other.cell, what: 'depth' } }], {
          deviceId: randomUUID(),
        }),
      ]),
    );
  });

  it('to students before the results: another sees nothing of it; the student it is for, once locked, what it comes to', async () => {
    expect(ACTIONS.filter((action) => mayEver('student', action))).toEqual([
      'task.read',
      'own.read',
      'own.record',
      'result.read',
    ]);
    const [own, other] = stage.students;
    const { sittingId } = stage;
    expectNothingOf(wire([await listTasks(other, {}), await readTask(other, { sittingId })]));
    const { prediction, ...task } = value(await readTask(own, { sittingId }));
    expectNothingOf(wire([await listTasks(own, {})]) + JSON.stringify(task));
    expect(prediction?.explanation.lost.points).toBe(100);
    const payload = JSON.stringify(prediction);
    expect(payload).not.toMatch(/modif|accommod|excus|splint|magnifier/i);
    expect(payload).not.toContain(accommodationId);
  });

  it('in the lists of a teacher’s work: periods, roster, sittings', async () => {
    const { teacher, sectionId, sittingId } = stage;
    expectNothingOf(
      wire([
        await listSections(teacher, {}),
        await readSectionRoster(teacher, { sectionId }),
        await listSittings(teacher, {}),
        await readSitting(teacher, { sittingId }),
      ]),
      { words: /modif|accommod|splint|magnifier|"lose":37/i },
    );
  });

  it('in the cells of the gradebook, to teacher or head', async () => {
    const { teacher, school, sectionId } = stage;
    for (const actor of [teacher, await makeActor(school, 'head')]) {
      const payload = wire([await readGradebook(actor, { sectionId })]);
      expectNothingOf(payload, { words: /modif|accommod|splint|magnifier|"lose":37/i });
    }
  });

  it('to teachers and heads of others', async () => {
    const { school, sectionId } = stage;
    const colleague = await makeActor(school, 'teacher');
    expect(code(await readGradebook(colleague, { sectionId }))).toBe('not_found');
    expect(code(await readReason(colleague, { accommodationId }))).toBe('not_found');
    expect(code(await endAccommodation(colleague, { accommodationId }))).toBe('not_found');
  });

  it('to an admin but as a line of the log that does not say for whom, what or why', async () => {
    const { school, students } = stage;
    const admin = await makeActor(school, 'admin');
    value(await readReason(stage.teacher, { accommodationId }));
    const payload = wire([await readLog(admin, { page: 1 })]);
    expectNothingOf(payload.replaceAll(/accommodation(?:\.(?:change|reason|list))?|modifiedRubrics?/g, ''));
    expect(payload).toContain('"modifiedRubric":"made"');
    expect(payload).toContain('accommodation.reason');
    const studentId = students[0].personId;
    const entries = value(await readLog(admin, { page: 1 })).entries;
    const unnamed = entries.filter(({ action }) => action.startsWith('accommodation.'));
    expect(unnamed.length).toBeGreaterThan(0);
    expect(unnamed.every(({ about }) => about === null)).toBe(true);
    expect(JSON.stringify(unnamed)).not.toContain(studentId);
    const about = value(await readLog(admin, { page: 1, aboutPersonId: studentId })).entries;
    expect(about.some(({ action }) => action.startsWith('accommodation.'))).toBe(false);
    const people = [await listPeople(admin, {}), await readPerson(admin, { personId: studentId })];
    expectNothingOf(wire(people));
  });

  it('in a mail that waits to be sent', async () => {
    const [row] = await ownerSql()<{ mails: number }[]>`
      select count(*)::int as mails from graphile_worker._private_jobs where payload::text ~* 'modif|accommod|splint'`;
    expect(row?.mails).toBe(0);
  });

  it('anywhere in the tables but where it belongs', async () => {
    const sql = ownerSql();
    const holding = async (text: string) => {
      const names: string[] = [];
      for (const table of await tenantTables(sql)) {
        const rows = await sql`select 1 from ${sql(table)} t where strpos(t::text, ${text}) > 0 limit 1`;
        if (rows.length > 0) names.push(table);
      }
      return names;
    };
    expect(await holding(REASON)).toEqual(['accommodation_reasons']);
    const named = await holding(accommodationId);
    expect(named.filter((table) => table !== 'results')).toEqual([
      'access_log',
      'accommodation_reasons',
      'accommodations',
      'score_sheets',
    ]);
  });
});

describe('once the results are out', () => {
  beforeAll(async () => {
    for (const each of [stage, plain]) await publish(each);
  });

  it('the student’s own result is priced by it and adds up, and has neither its name nor its reason', async () => {
    const { students, sittingId } = stage;
    const result = value(await readResult(students[0], { sittingId }));
    if (!result.sheet) throw new Error('a scored result has its sheet');
    expect(result.sheet.lost).toBe(100);
    const explained = explainScore(result.rubric, result.sheet, result.bonus);
    expect(explained.kept.ofTotal + explained.bonus + explained.rest).toBe(result.score);
    expect(explained.lost.points).toBe(100);
    const payload = JSON.stringify(result);
    expect(payload).not.toMatch(/modif|accommod|splint|magnifier/i);
    expect(payload).not.toContain(accommodationId);
  });

  it('another student’s result has nothing of it, and the tasks neither', async () => {
    const { students, sittingId } = stage;
    const answers = [
      await readResult(students[1], { sittingId }),
      await readTask(students[1], { sittingId }),
      await listTasks(students[1], {}),
    ];
    expectNothingOf(wire(answers));
    const { prediction, ...task } = value(await readTask(students[0], { sittingId }));
    expectNothingOf(JSON.stringify(task) + wire([await listTasks(students[0], {})]));
    const { predicted } = value(await readResult(students[0], { sittingId }));
    expect(prediction?.explanation.score).toBe(predicted);
  });

  it('the exports hold the score and nothing that tells how it was priced', async () => {
    const files = async ({ teacher, sectionId }: RoundStage) => [
      value(await exportGrades(teacher, { sectionId })),
      value(await exportSizes(teacher, { sectionId })),
    ];
    const [grades, sizes] = await files(stage);
    const [plainGrades, plainSizes] = await files(plain);
    for (const file of [grades, sizes])
      expectNothingOf(file?.text ?? '', { words: /modif|accommod|splint/i });
    const rows = (text = ''): Record<string, string>[] => parse(text, { columns: true });
    const scores = (text?: string) => rows(text).map((row) => [row['family name'], row.score]);
    expect(Object.keys(rows(grades?.text)[0] ?? {})).toEqual(Object.keys(rows(plainGrades?.text)[0] ?? {}));
    expect(Object.keys(rows(sizes?.text)[0] ?? {})).toEqual(Object.keys(rows(plainSizes?.text)[0] ?? {}));
    expect(scores(plainGrades?.text)).toEqual([
      ['Abbott', '97'],
      ['Brandt', '95'],
    ]);
    expect(scores(grades?.text)).toEqual([
      ['Abbott', '101'],
      ['Brandt', '95'],
    ]);
  });

  it('the file of sizes is, but for IDs, that of a class without one', async () => {
    const sizesOf = async ({ teacher, sectionId }: RoundStage) => {
      const { text } = value(await exportSizes(teacher, { sectionId }));
      const rows: Record<string, string>[] = parse(text, { columns: true });
      return rows.map(({ 'local ID': _, ...row }) => row);
    };
    const sizes = await sizesOf(stage);
    expect(sizes).toHaveLength(54);
    expect(sizes).toEqual(await sizesOf(plain));
  });

  it('a size that nobody read because it is excused is no row of the file of sizes', async () => {
    const stage = await stageRound();
    const { teacher, sectionId, sittingId, attempts, practical } = stage;
    await modifyFor(stage, { modification: MODIFICATION });
    const readings = readingsOf(teacher, attempts[0], practical.rubric);
    await push(
      teacher,
      sittingId,
      readings.filter(({ cell }) => cell.what !== 'thickness'),
    );
    await publish(stage);
    const rows: Record<string, string>[] = parse(value(await exportSizes(teacher, { sectionId })).text, {
      columns: true,
    });
    expect(new Set(rows.map(({ axis }) => axis))).toEqual(new Set(['width', 'length']));
    expect(rows.every(({ reading, points }) => reading !== '' && points !== '')).toBe(true);
  });
});
