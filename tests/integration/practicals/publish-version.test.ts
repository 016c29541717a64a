import { sql } from 'drizzle-orm';
import { describe, expect, it } from 'vitest';
import { archivePractical } from '@/lib/data/practicals/archive-practical';
import { publishVersion } from '@/lib/data/practicals/publish-version';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { readVersion } from '@/lib/data/practicals/read-version';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { starterDraft } from '@/lib/practicals/starters';
import { ENGINE_VERSION } from '@/lib/scoring/engine-version';
import { inSchoolAs, ownerSql } from '@/tests/support/database';
import {
  changeDraft,
  countPracticals,
  makeStarter,
  publishDraft,
  valueFrom,
} from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher');
const colleague = await makeActor(school, 'teacher');

describe('publishing a version', () => {
  it('stores what the draft reads as, with the engine that prices it, and numbers versions from 1', async () => {
    const practicalId = await makeStarter(teacher, 'desk-caddy');
    const first = valueFrom(await publishVersion(teacher, { practicalId, revision: 1 }));
    expect(first.number).toBe(1);
    const read = parseDraft(starterDraft('desk-caddy'));
    const expected = read.ok ? { task: read.task, form: read.form, rubric: read.rubric } : {};
    expect(await readVersion(teacher, { versionId: first.versionId })).toMatchObject({
      ok: true,
      value: { practicalId, number: 1, ...expected },
    });
    const [row] = await ownerSql()`
      select engine_version, published_by from rubric_versions where id = ${first.versionId}`;
    expect(row).toEqual({ engine_version: ENGINE_VERSION, published_by: teacher.personId });
    await changeDraft(teacher, practicalId, (draft) => {
      draft.all.worth = '12';
    });
    expect((await publishDraft(teacher, practicalId)).number).toBe(2);
    const { versions, latest } = valueFrom(await readPractical(teacher, { practicalId }));
    expect(versions.map(({ number }) => number)).toEqual([2, 1]);
    expect(latest?.form.defaults.worth).toBe(1200);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({ details: { published: 'Desk caddy', version: 2 } }),
    );
  });

  it('refuses a draft with bad fields, and names each of them', async () => {
    const practicalId = await makeStarter(teacher);
    const revision = await changeDraft(teacher, practicalId, (draft) => {
      Object.assign(draft.lines[0] ?? {}, { width: 'wide', quantity: '' });
      draft.reading.margin = '';
    });
    const before = await countPracticals(school);
    const refused = await publishVersion(teacher, { practicalId, revision });
    expect(refused).toMatchObject({ ok: false, problem: { code: 'invalid' } });
    expect(!refused.ok && Object.keys(refused.problem.fields ?? {}).sort()).toEqual([
      'lines.0.quantity',
      'lines.0.width',
      'reading.margin',
    ]);
    expect(await countPracticals(school)).toEqual(before);
  });

  it('refuses when nothing changed in effect, even if it is typed otherwise', async () => {
    const practicalId = await makeStarter(teacher);
    await publishDraft(teacher, practicalId);
    const revision = await changeDraft(teacher, practicalId, (draft) => {
      Object.assign(draft.lines[0] ?? {}, { width: '4.5', length: '9"' });
      draft.all.missing = '9';
    });
    expect(await publishVersion(teacher, { practicalId, revision })).toMatchObject({
      ok: false,
      problem: { code: 'conflict', message: expect.stringContaining('since version 1') },
    });
    const changed = await changeDraft(teacher, practicalId, (draft) => {
      draft.redo.capPercent = '100';
    });
    expect(await publishVersion(teacher, { practicalId, revision: changed })).toMatchObject({ ok: true });
  });

  it('refuses a draft that was changed since it was looked at', async () => {
    const practicalId = await makeStarter(teacher);
    await changeDraft(teacher, practicalId, (draft) => {
      draft.all.worth = '1';
    });
    expect(await publishVersion(teacher, { practicalId, revision: 1 })).toMatchObject({
      ok: false,
      problem: { code: 'stale' },
    });
  });

  it('gives two presses at once one version', async () => {
    const practicalId = await makeStarter(teacher);
    const pressed = await Promise.all(
      [1, 2].map(() => publishVersion(teacher, { practicalId, revision: 1 })),
    );
    expect(pressed.filter(({ ok }) => ok)).toHaveLength(1);
    const { versions } = valueFrom(await readPractical(teacher, { practicalId }));
    expect(versions).toHaveLength(1);
  });

  it('is refused to everybody but the owner, and while the practical is put away', async () => {
    const practicalId = await makeStarter(teacher);
    const before = await countPracticals(school);
    expect(await publishVersion(colleague, { practicalId, revision: 1 })).toMatchObject({
      ok: false,
      problem: { code: 'not_found' },
    });
    for (const role of ['head', 'admin', 'aide', 'student'] as const) {
      expect(await publishVersion(await makeActor(school, role), { practicalId, revision: 1 })).toMatchObject(
        {
          ok: false,
          problem: { code: 'forbidden' },
        },
      );
    }
    expect(await countPracticals(school)).toEqual(before);
    valueFrom(await archivePractical(teacher, { practicalId, archived: true }));
    expect(await publishVersion(teacher, { practicalId, revision: 1 })).toMatchObject({
      ok: false,
      problem: { code: 'conflict' },
    });
  });

  it('stores no version when the log cannot be written', async () => {
    const practicalId = await makeStarter(teacher);
    const before = await countPracticals(school);
    await whileLogFails(() => publishVersion(teacher, { practicalId, revision: 1 }));
    expect(await countPracticals(school)).toEqual(before);
  });
});

describe('a published version', () => {
  const causes = (error: unknown): string =>
    error instanceof Error ? `${error.message} ${causes(error.cause)}` : '';

  it.each([
    ['changed', sql`update rubric_versions set rubric = '{}'`],
    ['renumbered', sql`update rubric_versions set number = number + 1`],
    ['deleted', sql`delete from rubric_versions`],
    ['emptied', sql`truncate rubric_versions`],
    ['freed from its guard', sql`alter table rubric_versions disable trigger never_changed`],
    [
      'overwritten on conflict',
      sql`insert into rubric_versions select * from rubric_versions
          on conflict (school_id, id) do update set rubric = '{}'`,
    ],
  ])('cannot be %s by the product’s own role', async (_, statement) => {
    const practicalId = await makeStarter(teacher);
    await publishDraft(teacher, practicalId);
    const stored = await ownerSql()`select * from rubric_versions order by id`;
    const refused = await inSchoolAs(school.id, (tx) => tx.execute(statement)).catch(
      (error: unknown) => error,
    );
    expect(causes(refused)).toMatch(/permission denied|must be owner/);
    expect(await ownerSql()`select * from rubric_versions order by id`).toEqual(stored);
  });

  it('cannot be changed even by the owner of the database, while its guard stands', async () => {
    const refused = await ownerSql()`update rubric_versions set number = 9`.catch((error: unknown) => error);
    expect(causes(refused)).toMatch(/never changed/);
  });

  it('is read by its owner and the head of the department, and is nothing to anybody else', async () => {
    const { versionId } = await publishDraft(teacher, await makeStarter(teacher));
    const head = await makeActor(school, 'head');
    expect(await readVersion(head, { versionId })).toMatchObject({ ok: true });
    expect(await readVersion(colleague, { versionId })).toMatchObject({ problem: { code: 'not_found' } });
    const elsewhere = { ...head, departmentId: crypto.randomUUID() };
    expect(await readVersion(elsewhere, { versionId })).toMatchObject({ problem: { code: 'not_found' } });
    const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'head');
    expect(await readVersion(stranger, { versionId })).toMatchObject({ problem: { code: 'not_found' } });
  });
});
