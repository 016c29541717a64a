import { readdirSync, readFileSync } from 'node:fs';
import { sql } from 'drizzle-orm';
import { beforeAll, describe, expect, it } from 'vitest';
import type { Actor } from '@/lib/auth/actor';
import { approveVersion } from '@/lib/data/department/approve-version';
import { compareVersions } from '@/lib/data/department/compare-versions';
import { endApproval } from '@/lib/data/department/end-approval';
import { listRubrics } from '@/lib/data/department/list-rubrics';
import { listShared } from '@/lib/data/department/list-shared';
import { readDeclaredDifferences } from '@/lib/data/department/read-declared-differences';
import { readSharedVersion } from '@/lib/data/department/read-shared-version';
import { archivePractical } from '@/lib/data/practicals/archive-practical';
import { copyPractical } from '@/lib/data/practicals/copy-practical';
import { createPractical } from '@/lib/data/practicals/create-practical';
import { exportPractical } from '@/lib/data/practicals/export-practical';
import { importPractical } from '@/lib/data/practicals/import-practical';
import { listPracticals } from '@/lib/data/practicals/list-practicals';
import { listVariants } from '@/lib/data/practicals/list-variants';
import { listVersions } from '@/lib/data/practicals/list-versions';
import { makeVariants } from '@/lib/data/practicals/make-variants';
import { offerPractical } from '@/lib/data/practicals/offer-practical';
import { proposeVariants } from '@/lib/data/practicals/propose-variants';
import { publishVersion } from '@/lib/data/practicals/publish-version';
import { putBackDraft } from '@/lib/data/practicals/put-back-draft';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { readSchoolUnit } from '@/lib/data/practicals/read-school-unit';
import { readVersion } from '@/lib/data/practicals/read-version';
import { readVersionSheet } from '@/lib/data/practicals/read-version-sheet';
import { saveDraft } from '@/lib/data/practicals/save-draft';
import { takeBackVersion } from '@/lib/data/practicals/take-back-version';
import { takeNewerVersion } from '@/lib/data/practicals/take-newer-version';
import { takePrices } from '@/lib/data/practicals/take-prices';
import { keepEvents } from '@/lib/data/rounds/keep-events';
import { listRounds } from '@/lib/data/rounds/list-rounds';
import { readInHand } from '@/lib/data/rounds/read-in-hand';
import { readRound } from '@/lib/data/rounds/read-round';
import { takeInHand } from '@/lib/data/rounds/take-in-hand';
import { changeAttempt } from '@/lib/data/sittings/change-attempt';
import { changeDue } from '@/lib/data/sittings/change-due';
import { listSittings } from '@/lib/data/sittings/list-sittings';
import { moveSitting } from '@/lib/data/sittings/move-sitting';
import { openSitting } from '@/lib/data/sittings/open-sitting';
import { previewMove } from '@/lib/data/sittings/preview-move';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { publishSitting } from '@/lib/data/sittings/publish-sitting';
import { readMoveChoices } from '@/lib/data/sittings/read-move-choices';
import { readOpenChoices } from '@/lib/data/sittings/read-open-choices';
import { readSitting } from '@/lib/data/sittings/read-sitting';
import { startRedo } from '@/lib/data/sittings/start-redo';
import { undoMove } from '@/lib/data/sittings/undo-move';
import { writePracticalFile } from '@/lib/practicals/practical-file';
import type { Result } from '@/lib/result';
import { PROTOCOL_VERSION } from '@/lib/sync/protocol';
import { inSchoolAs, ownerSql } from '@/tests/support/database';
import { markPieces } from '@/tests/support/mark-pieces';
import { changeDraft, publishDraft, valueFrom } from '@/tests/support/practicals';
import { eventOf, type RoundStage, stageRound } from '@/tests/support/round-stage';
import { defaultForm, defaultTask } from '@/tests/support/rubrics';
import { makeActor, makeSection } from '@/tests/support/school';
import { asProposed, makeProposed, publishedStarter } from '@/tests/support/variants';

let stage: RoundStage;
let head: Actor;
let second: { versionId: string; number: number };

/** Every stored version of the school, byte for byte, by its id. */
async function stored(): Promise<Map<string, string>> {
  const rows = await ownerSql()<{ id: string; bytes: string }[]>`
    select id, v::text as bytes from rubric_versions v where school_id = ${stage.school.id} order by id`;
  return new Map(rows.map(({ id, bytes }) => [id, bytes]));
}

/** Fails when a version that was there before is gone or another; new ones are no change. */
async function expectUntouched(before: Map<string, string>): Promise<void> {
  const after = await stored();
  for (const [id, bytes] of before) expect(after.get(id)).toBe(bytes);
}

beforeAll(async () => {
  stage = await stageRound();
  head = await makeActor(stage.school, 'head');
  const { teacher, practical } = stage;
  await changeDraft(teacher, practical.practicalId, (draft) => {
    draft.all.worth = '12';
  });
  second = await publishDraft(teacher, practical.practicalId);
});

describe('the product’s own role', () => {
  const causes = (error: unknown): string =>
    error instanceof Error ? `${error.message} ${causes(error.cause)}` : '';
  const copy = sql`insert into rubric_versions select * from rubric_versions`;

  it.each([
    ['update it', sql`update rubric_versions set form = '{}'`],
    ['update one column of it', sql`update rubric_versions set difference_reason = 'none'`],
    ['update it to what it is', sql`update rubric_versions set number = number`],
    [
      'update it through what it is read from',
      sql`update rubric_versions v set task = '{}' from practicals p where p.id = v.practical_id`,
    ],
    [
      'update it within a reading statement',
      sql`with changed as (update rubric_versions set rubric = '{}' returning 1) select * from changed`,
    ],
    ['delete it', sql`delete from rubric_versions`],
    ['delete it with what it belongs to', sql`delete from practicals`],
    ['empty the table', sql`truncate rubric_versions`],
    ['empty the table with all that hangs on it', sql`truncate practicals cascade`],
    ['insert over it', sql`${copy} on conflict (school_id, id) do update set rubric = excluded.rubric`],
    [
      'insert over its number',
      sql`${copy} on conflict (school_id, practical_id, number) do update set rubric = '{}'`,
    ],
    [
      'merge into it',
      sql`merge into rubric_versions v using practicals p on p.id = v.practical_id when matched then update set rubric = '{}'`,
    ],
    [
      'merge it away',
      sql`merge into rubric_versions v using practicals p on p.id = v.practical_id when matched then delete`,
    ],
    ['lock it for a change', sql`select 1 from rubric_versions for update`],
    ['disable its guard', sql`alter table rubric_versions disable trigger never_changed`],
    ['disable every guard', sql`alter table rubric_versions disable trigger all`],
    ['drop its guard', sql`drop trigger never_changed on rubric_versions`],
    [
      'replace what the guard does',
      sql`create or replace function refuse_change() returns trigger language plpgsql as 'begin return new; end'`,
    ],
    ['pass by the guards for a session', sql`set session_replication_role = replica`],
    ['pass by the guards for a transaction', sql`set local session_replication_role = replica`],
    ['pass by the guards by a setting', sql`select set_config('session_replication_role', 'replica', true)`],
    ['become the owner', sql`alter table rubric_versions owner to trymark_app`],
    ['rename the table away', sql`alter table rubric_versions rename to old_versions`],
    ['put a rule in its place', sql`create rule away as on insert to rubric_versions do instead nothing`],
    ['drop the table', sql`drop table rubric_versions cascade`],
    ['turn off the school’s wall', sql`alter table rubric_versions disable row level security`],
  ])('cannot %s', async (_, statement) => {
    const before = await stored();
    const refused = await inSchoolAs(stage.school.id, (tx) => tx.execute(statement)).catch(
      (error: unknown) => error,
    );
    expect(causes(refused)).toMatch(/permission denied|must be owner|must be able to SET ROLE/);
    expect(await stored()).toEqual(before);
  });

  it('can read it and insert a next one, so that the refusals above mean something', async () => {
    const before = await stored();
    const rows = await inSchoolAs(stage.school.id, (tx) => tx.execute(sql`select 1 from rubric_versions`));
    expect(rows.length).toBe(before.size);
    const [granted] = await ownerSql()`
      select array_agg(privilege_type::text order by privilege_type) as rights
      from information_schema.role_table_grants
      where table_name = 'rubric_versions' and grantee in ('trymark_app', 'PUBLIC')`;
    expect(granted?.rights).toEqual(['INSERT', 'SELECT']);
  });

  it('gives itself no right: what it grants is granted to nobody', async () => {
    await inSchoolAs(stage.school.id, async (tx) => {
      await tx.execute(sql`grant all on rubric_versions to trymark_app`);
    });
    const refused = await inSchoolAs(stage.school.id, (tx) =>
      tx.execute(sql`update rubric_versions set form = '{}'`),
    ).catch((error: unknown) => error);
    expect(causes(refused)).toContain('permission denied');
  });

  it.each(['trymark_auth', 'trymark_worker'])('nor has %s any right on it', async (role) => {
    const [row] = await ownerSql()`
      select has_any_column_privilege(${role}, 'rubric_versions', 'select, insert, update') as some,
        has_table_privilege(${role}, 'rubric_versions', 'delete, truncate, trigger') as more`;
    expect(row).toEqual({ some: false, more: false });
  });
});

describe('every verb around a published version', () => {
  const revisionOf = async (practicalId: string) =>
    valueFrom(await readPractical(stage.teacher, { practicalId })).draft.revision;
  const original = () => stage.practical.practicalId;
  const first = () => stage.practical.versionId;
  const offered = async () =>
    valueFrom(await offerPractical(stage.teacher, { practicalId: original(), offered: true }));
  const copied = async () =>
    valueFrom(await copyPractical(stage.teacher, { practicalId: original(), versionId: first() }));

  async function takenOver() {
    const { practicalId } = await copied();
    const revision = await revisionOf(practicalId);
    const { versionId } = second;
    return {
      practicalId,
      taken: await takeNewerVersion(stage.teacher, { practicalId, revision, versionId }),
    };
  }

  async function moved() {
    const { teacher, sittingId } = stage;
    const { versionId } = valueFrom(await previewChoice());
    const { seen } = valueFrom(await previewMove(teacher, { sittingId, versionId }));
    return moveSitting(teacher, { sittingId, versionId, holdHarmless: true, seen });
  }

  /** The version that the sitting does not stand under. */
  async function previewChoice(): Promise<Result<{ versionId: string }>> {
    const [row] = await ownerSql()<{ at: string }[]>`
      select rubric_version_id as at from sittings where id = ${stage.sittingId}`;
    return { ok: true, value: { versionId: row?.at === first() ? second.versionId : first() } };
  }

  const CALLS: Record<string, () => Promise<Result<unknown>>> = {
    'practicals/archive-practical': async () => {
      const { practicalId } = await publishedStarter(stage.teacher, 'six-stick');
      return archivePractical(stage.teacher, { practicalId, archived: true });
    },
    'practicals/copy-practical': () =>
      copyPractical(stage.teacher, { practicalId: original(), versionId: first() }),
    'practicals/create-practical': () =>
      createPractical(stage.teacher, { from: 'starter', starter: 'wall-rack' }),
    'practicals/export-practical': () =>
      exportPractical(stage.teacher, { practicalId: original(), version: 1 }),
    'practicals/import-practical': () =>
      importPractical(stage.teacher, { text: writePracticalFile(defaultTask(), defaultForm()) }),
    'practicals/list-practicals': () => listPracticals(stage.teacher, {}),
    'practicals/list-variants': () => listVariants(stage.teacher, { practicalId: original() }),
    'practicals/list-versions': () => listVersions(stage.teacher, { practicalId: original() }),
    'practicals/make-variants': async () => {
      const { practicalId } = await publishedStarter(stage.teacher, 'desk-caddy');
      const proposed = valueFrom(await proposeVariants(stage.teacher, { practicalId, count: 1 }));
      return makeVariants(stage.teacher, asProposed(proposed));
    },
    'practicals/offer-practical': () =>
      offerPractical(stage.teacher, { practicalId: original(), offered: true }),
    'practicals/propose-variants': async () => {
      const { practicalId } = await publishedStarter(stage.teacher, 'desk-caddy');
      return proposeVariants(stage.teacher, { practicalId, count: 1 });
    },
    'practicals/publish-version': async () => {
      const revision = await changeDraft(stage.teacher, original(), (draft) => {
        draft.all.worth = '15';
      });
      return publishVersion(stage.teacher, { practicalId: original(), revision });
    },
    'practicals/put-back-draft': async () => {
      const { practicalId } = await takenOver();
      return putBackDraft(stage.teacher, { practicalId, revision: await revisionOf(practicalId) });
    },
    'practicals/read-practical': () => readPractical(stage.teacher, { practicalId: original() }),
    'practicals/read-school-unit': () => readSchoolUnit(stage.teacher, {}),
    'practicals/read-version': () => readVersion(stage.teacher, { versionId: first() }),
    'practicals/read-version-sheet': () =>
      readVersionSheet(stage.teacher, { practicalId: original(), number: 2 }),
    'practicals/save-draft': async () => {
      const { draft } = valueFrom(await readPractical(stage.teacher, { practicalId: original() }));
      const { revision, content } = draft;
      return saveDraft(stage.teacher, { practicalId: original(), revision, content });
    },
    'practicals/take-back-version': async () =>
      takeBackVersion(stage.teacher, {
        practicalId: original(),
        number: 1,
        revision: await revisionOf(original()),
      }),
    'practicals/take-newer-version': async () => (await takenOver()).taken,
    'practicals/take-prices': async () => {
      const { practicalId } = await publishedStarter(stage.teacher, 'desk-caddy');
      const variant = (await makeProposed(stage.teacher, practicalId, 1))[0]?.practicalId ?? '';
      await changeDraft(stage.teacher, practicalId, (draft) => {
        draft.all.worth = '12';
      });
      const { versionId } = await publishDraft(stage.teacher, practicalId);
      const revision = await revisionOf(variant);
      return takePrices(stage.teacher, { practicalId: variant, revision, versionId });
    },
    'department/approve-version': async () => {
      await offered();
      return approveVersion(head, { versionId: first() });
    },
    'department/compare-versions': () => compareVersions(head, { versionIds: [first(), second.versionId] }),
    'department/end-approval': async () => {
      await offered();
      const { approvalId } = valueFrom(await approveVersion(head, { versionId: first() }));
      return endApproval(head, { approvalId });
    },
    'department/list-rubrics': () => listRubrics(head, {}),
    'department/list-shared': () => listShared(head, {}),
    'department/read-declared-differences': async () => {
      await offered();
      valueFrom(await approveVersion(head, { versionId: first() }));
      return readDeclaredDifferences(head, { versionId: first() });
    },
    'department/read-shared-version': async () => {
      await offered();
      return readSharedVersion(head, { versionId: first() });
    },
    'sittings/change-attempt': () =>
      changeAttempt(stage.teacher, {
        sittingId: stage.sittingId,
        attemptId: stage.attempts[1],
        standing: 'absent',
      }),
    'sittings/change-due': () =>
      changeDue(stage.teacher, { sittingId: stage.sittingId, dueOn: '2026-12-18' }),
    'sittings/list-sittings': () => listSittings(stage.teacher, {}),
    'sittings/move-sitting': moved,
    'sittings/open-sitting': async () => {
      const { school, teacher } = stage;
      const sectionId = await makeSection(school, { teacherIds: [teacher.personId] });
      return openSitting(teacher, { sectionId, versionId: first(), dueOn: null });
    },
    'sittings/preview-move': async () =>
      previewMove(stage.teacher, {
        sittingId: stage.sittingId,
        versionId: valueFrom(await previewChoice()).versionId,
      }),
    'sittings/preview-publication': () => previewPublication(stage.teacher, { sittingId: stage.sittingId }),
    'sittings/publish-sitting': async () => {
      const { teacher, sittingId, attempts, practical } = stage;
      await markPieces(teacher, sittingId, attempts[0], practical.rubric);
      const { seen } = valueFrom(await previewPublication(teacher, { sittingId }));
      return publishSitting(teacher, { sittingId, withoutUnread: true, seen });
    },
    'sittings/read-move-choices': () => readMoveChoices(stage.teacher, { sittingId: stage.sittingId }),
    'sittings/read-open-choices': () => readOpenChoices(stage.teacher, {}),
    'sittings/read-sitting': () => readSitting(stage.teacher, { sittingId: stage.sittingId }),
    'sittings/start-redo': () =>
      startRedo(stage.teacher, {
        sittingId: stage.sittingId,
        studentId: stage.students[0].personId,
      }),
    'sittings/undo-move': async () => {
      valueFrom(await moved());
      const [move] = await ownerSql()<{ id: string }[]>`
        select id from sitting_moves where sitting_id = ${stage.sittingId} and undone_at is null
        order by number desc limit 1`;
      return undoMove(stage.teacher, { sittingId: stage.sittingId, moveId: move?.id });
    },
    'rounds/keep-events': () =>
      keepEvents(stage.teacher, {
        sittingId: stage.sittingId,
        push: {
          protocol: PROTOCOL_VERSION,
          deviceId: crypto.randomUUID(),
          events: [eventOf(stage.teacher, stage.attempts[1])],
        },
      }),
    'rounds/list-rounds': () => listRounds(stage.teacher, {}),
    'rounds/read-in-hand': () =>
      readInHand(stage.teacher, { sittingId: stage.sittingId, deviceId: crypto.randomUUID() }),
    'rounds/read-round': () => readRound(stage.teacher, { sittingId: stage.sittingId }),
    'rounds/take-in-hand': () =>
      takeInHand(stage.teacher, {
        sittingId: stage.sittingId,
        deviceId: crypto.randomUUID(),
        attemptId: stage.attempts[0],
      }),
  };

  it('is called by this test', () => {
    const verbs = ['practicals', 'department', 'sittings', 'rounds'].flatMap((area) =>
      readdirSync(`lib/data/${area}`)
        .filter((file) => /defineVerb\(/.test(readFileSync(`lib/data/${area}/${file}`, 'utf8')))
        .map((file) => `${area}/${file.replace('.ts', '')}`),
    );
    expect(verbs.toSorted()).toEqual(Object.keys(CALLS).toSorted());
  });

  it.each(Object.entries(CALLS))('%s leaves it byte for byte', async (_, call) => {
    const before = await stored();
    expect(before.size).toBeGreaterThan(1);
    const result = await call();
    expect(result).toMatchObject({ ok: true });
    await expectUntouched(before);
  });
});

describe('the source', () => {
  const filesIn = (folder: string): string[] =>
    readdirSync(folder, { recursive: true, encoding: 'utf8' })
      .filter((file) => /\.(ts|tsx)$/.test(file))
      .map((file) => `${folder}/${file}`);
  const sources = ['app', 'components', 'db', 'lib'].flatMap(filesIn);
  const textOf = (file: string) => readFileSync(file, 'utf8');

  it('has no statement that changes or deletes a version', () => {
    const changing = sources.filter((file) =>
      /\.(update|delete)\(\s*(schema\.)?rubricVersions\b|(update|delete\s+from|truncate|merge\s+into)\s+"?rubric_versions|onConflictDoUpdate[\s\S]{0,200}rubricVersions/i.test(
        textOf(file),
      ),
    );
    expect(changing).toEqual([]);
  });

  it('inserts a version in one place of the product, and in the demo', () => {
    const inserting = sources.filter((file) => /insert\(\s*(schema\.)?rubricVersions\b/.test(textOf(file)));
    expect(inserting.toSorted()).toEqual(['db/queries/practicals.ts', 'db/seed/practicals.ts']);
  });

  it('names the table only in its schema and in queries; screens, actions and handlers go through verbs', () => {
    const naming = sources.filter((file) => /\brubricVersions\b|\brubric_versions\b/.test(textOf(file)));
    expect(naming.filter((file) => !/^db\/(schema|queries|seed|migrations)\//.test(file))).toEqual([]);
    const screens = sources.filter((file) => /^(app|components)\//.test(file));
    const reaching = screens.filter((file) => /from '@\/db\//.test(textOf(file)));
    expect(reaching).toEqual([]);
  });
});
