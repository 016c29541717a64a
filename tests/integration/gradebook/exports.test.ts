import { createHash } from 'node:crypto';
import { mkdtemp, rm } from 'node:fs/promises';
import { tmpdir } from 'node:os';
import { join } from 'node:path';
import { parse } from 'csv-parse/sync';
import { afterAll, beforeAll, describe, expect, it } from 'vitest';
import { exportGrades, exportSizes } from '@/lib/data/gradebook/export-files';
import { readGradebook } from '@/lib/data/gradebook/read-gradebook';
import { sendAgain } from '@/lib/data/gradebook/send-again';
import { changeAttempt } from '@/lib/data/sittings/change-attempt';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import { scoreAttempt } from '@/lib/scoring';
import { store } from '@/lib/storage';
import { deriveAttempt } from '@/lib/sync/derive';
import type { Listening } from '@/scripts/services/http';
import { startS3 } from '@/scripts/services/s3';
import { code, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { enroll, makeAttempt } from '@/tests/support/factories';
import { lockPrediction, markPieces, readingsOf } from '@/tests/support/mark-pieces';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';
import { logOf, makeActor, makePerson, whileLogFails } from '@/tests/support/school';

const KEYS = { accessKeyId: 'tests', secretAccessKey: 'a secret of the tests' };
const SHORT = { 'base/1/length': '6 15/16', 'end/1/length': '3 29/32', 'divider/2/width': '2 1/16' };

let s3: Listening;
let folder: string;

// The settings are read once, at the first export: the store must stand before.
beforeAll(async () => {
  folder = await mkdtemp(join(tmpdir(), 'trymark-exports-'));
  s3 = await startS3({ ...KEYS, port: 0, folder, bucket: 'trymark' });
  process.env.S3_ENDPOINT = `http://127.0.0.1:${s3.port}`;
  process.env.S3_BUCKET = 'trymark';
  process.env.S3_ACCESS_KEY_ID = KEYS.accessKeyId;
  process.env.S3_SECRET_ACCESS_KEY = KEYS.secretAccessKey;
});

afterAll(async () => {
  await s3.close();
  await rm(folder, { recursive: true });
});

async function publish({ teacher, sittingId }: RoundStage) {
  const { seen } = value(await previewPublication(teacher, { sittingId }));
  return publishSitting(teacher, { sittingId, withoutUnread: true, lateLocks: 'leave out', seen });
}

/** Ana loses points and has a prediction, Ben is absent; a third student's name begins like a formula, with nothing read. */
async function publishedClass(): Promise<RoundStage> {
  const stage = await stageRound();
  const { teacher, sittingId, attempts, practical, school, sectionId, students } = stage;
  const { personId } = await makePerson(school, ['student'], {
    familyName: '=Zed()',
    givenName: '@Zoe',
    localId: '00007',
  });
  await enroll(school, sectionId, personId);
  await makeAttempt(school, sittingId, personId);
  await lockPrediction(students[0], sittingId, attempts[0], practical.rubric, SHORT);
  await markPieces(teacher, sittingId, attempts[0], practical.rubric, SHORT);
  await changeAttempt(teacher, { sittingId, attemptId: attempts[1], standing: 'absent' });
  value(await publish(stage));
  return stage;
}

const table = (text: string): Record<string, string>[] => parse(text, { columns: true });

describe('exportGrades', () => {
  it('gives one row a student and attempt that reads back as the engine’s scores', async () => {
    const { teacher, sectionId, attempts, practical, students } = await publishedClass();
    const file = value(await exportGrades(teacher, { sectionId }));
    expect(file.text.split('\r\n')[0]).toBe(
      'local ID,family name,given name,period,term,practical,attempt,status,score,out of,percent,predicted,measured at,rubric version',
    );
    expect(file.text.replaceAll('\r\n', '')).not.toMatch(/[\r\n]/);
    const rows = table(file.text);
    const recorded = deriveAttempt(
      readingsOf(teacher, attempts[0], practical.rubric, SHORT),
      'bench',
    ).attempt;
    const engine = scoreAttempt(practical.rubric, { ...recorded, bonus: 200 });
    expect(rows.find((row) => row['family name'] === 'Abbott')).toEqual({
      'local ID': expect.stringMatching(/^00/),
      'family name': 'Abbott',
      'given name': 'Ana',
      period: '3',
      term: 'this term',
      practical: 'Nine parts',
      attempt: '1',
      status: 'scored',
      score: String((engine.score ?? 0) / 100),
      'out of': '100',
      percent: String((engine.score ?? 0) / 100),
      predicted: '95',
      'measured at': '2026-12-01T09:00:00-06:00',
      'rubric version': '1',
    });
    expect(students).toHaveLength(2);
  });

  it('leaves the numbers blank where the status is none, and guards names that begin like a formula', async () => {
    const { teacher, sectionId } = await publishedClass();
    const rows = table(value(await exportGrades(teacher, { sectionId })).text);
    expect(
      rows.map((row) => [
        row['family name'],
        row['given name'],
        row['local ID']?.slice(0, 2),
        row.status,
        row.score,
        row.percent,
      ]),
    ).toEqual([
      ["'=Zed()", "'@Zoe", '00', 'not read', '', ''],
      ['Abbott', 'Ana', '00', 'scored', '97', '97'],
      ['Brandt', 'Ben', '00', 'absent', '', ''],
    ]);
  });

  it('gives the same bytes for the same data, keeps them, and sends them again', async () => {
    const { teacher, sectionId, sittingId, school } = await publishedClass();
    const first = value(await exportGrades(teacher, { sectionId, sittingId }));
    const second = value(await exportGrades(teacher, { sectionId, sittingId }));
    expect(second.text).toBe(first.text);
    expect(first.fileName).toBe('period-3-nine-parts-grades.csv');
    const again = value(await sendAgain(teacher, { fileId: first.fileId }));
    expect(Buffer.from(again.bytes).toString('utf8')).toBe(first.text);
    expect(createHash('sha256').update(again.bytes).digest('hex')).toBe(first.sha256);
    const { files } = value(await readGradebook(teacher, { sectionId }));
    expect(files).toHaveLength(2);
    expect(files[0]).toMatchObject({
      fileName: first.fileName,
      rows: 3,
      sha256: first.sha256,
      sentBy: 'Dayo Okonjo',
    });
    expect((await logOf(school)).filter(({ action }) => action === 'grades.export')).toHaveLength(3);
  });

  it('does not send a kept file whose bytes are no longer the same', async () => {
    const { teacher, sectionId } = await publishedClass();
    const { fileId } = value(await exportGrades(teacher, { sectionId }));
    const [kept] = await ownerSql()<{ storage_key: string }[]>`
      select storage_key from export_files where id = ${fileId}`;
    await store()?.putObject(kept?.storage_key ?? '', 'local ID,score\r\n00417,100\r\n', 'text/csv');
    expect(code(await sendAgain(teacher, { fileId }))).toBe('conflict');
    await store()?.deleteObject(kept?.storage_key ?? '');
    expect(code(await sendAgain(teacher, { fileId }))).toBe('conflict');
  });

  it('sends only what is published, as it was published', async () => {
    const stage = await stageRound();
    const { teacher, sectionId, sittingId, attempts, practical } = stage;
    expect(code(await exportGrades(teacher, { sectionId }))).toBe('conflict');
    await markPieces(teacher, sittingId, attempts[0], practical.rubric);
    value(await publish(stage));
    const before = value(await exportGrades(teacher, { sectionId })).text;
    await changeAttempt(teacher, { sittingId, attemptId: attempts[0], standing: 'zero' });
    expect(value(await exportGrades(teacher, { sectionId })).text).toBe(before);
    value(await publish(stage));
    expect(table(value(await exportGrades(teacher, { sectionId })).text)[0]).toMatchObject({
      status: 'zero',
      score: '0',
      percent: '0',
    });
  });

  it('is the own teacher’s and the admin’s alone', async () => {
    const { teacher, sectionId, school, aide } = await publishedClass();
    const { fileId } = value(await exportGrades(teacher, { sectionId }));
    const admin = await makeActor(school, 'admin');
    expect(code(await exportGrades(admin, { sectionId }))).toBe('ok');
    expect(code(await sendAgain(admin, { fileId }))).toBe('ok');
    for (const actor of [aide, await makeActor(school, 'head')]) {
      expect(code(await exportGrades(actor, { sectionId }))).toBe('forbidden');
      expect(code(await sendAgain(actor, { fileId }))).toBe('forbidden');
    }
    const stranger = await makeActor(school, 'teacher');
    expect(code(await exportGrades(stranger, { sectionId }))).toBe('not_found');
    expect(code(await exportSizes(stranger, { sectionId }))).toBe('not_found');
    expect(code(await sendAgain(stranger, { fileId }))).toBe('not_found');
    expect(code(await exportGrades(teacher, { sectionId, sittingId: 'x' }))).toBe('invalid');
    expect(code(await exportGrades(teacher, { sectionId, sittingId: fileId }))).toBe('not_found');
  });

  it('notes no file when its last write fails', async () => {
    const { teacher, sectionId } = await publishedClass();
    expect(await whileLogFails(() => exportGrades(teacher, { sectionId }))).toBeInstanceOf(Error);
    expect(value(await readGradebook(teacher, { sectionId })).files).toEqual([]);
  });
});

describe('exportSizes', () => {
  it('gives one row a size with exact decimals, a deviation below zero as a number', async () => {
    const { teacher, sectionId } = await publishedClass();
    const file = value(await exportSizes(teacher, { sectionId }));
    const rows = table(file.text);
    expect(rows).toHaveLength(27);
    const pick = ({
      piece,
      axis,
      target,
      reading,
      deviation,
      unit,
      band,
      points,
    }: Record<string, string>) => ({ piece, axis, target, reading, deviation, unit, band, points });
    const lost = rows.filter((row) => row.points !== '0').map(pick);
    expect(lost).toEqual([
      {
        piece: 'base',
        axis: 'length',
        target: '7',
        reading: '6.9375',
        deviation: '-0.0625',
        unit: 'in',
        band: '1',
        points: '1',
      },
      {
        piece: 'end 1',
        axis: 'length',
        target: '4',
        reading: '3.90625',
        deviation: '-0.09375',
        unit: 'in',
        band: '2',
        points: '2',
      },
      {
        piece: 'divider 2',
        axis: 'width',
        target: '2',
        reading: '2.0625',
        deviation: '0.0625',
        unit: 'in',
        band: '1',
        points: '1',
      },
    ]);
    expect(
      rows.filter((row) => row.points === '0').every((row) => row.band === '0' && row.deviation === '0'),
    ).toBe(true);
    expect(value(await exportSizes(teacher, { sectionId })).text).toBe(file.text);
    expect(file.fileName).toBe('period-3-woods-2-sizes.csv');
  });
});
