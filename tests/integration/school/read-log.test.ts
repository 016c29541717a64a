import { expect, it } from 'vitest';
import { archivePractical } from '@/lib/data/practicals/archive-practical';
import { readLog } from '@/lib/data/school/read-log';
import { readSitting } from '@/lib/data/sittings/read-sitting';
import { value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { stageRound } from '@/tests/support/round-stage';
import { makeActor, makePerson, makeSchool } from '@/tests/support/school';

const sql = ownerSql();
const school = await makeSchool();
const admin = await makeActor(school, 'admin', { givenName: 'Ada', familyName: 'Whitehorse' });
const teacher = await makePerson(school, ['teacher'], { givenName: 'Noor', familyName: 'Castellanos' });
const student = await makePerson(school, ['student'], { givenName: 'Wayra', familyName: 'Quispe' });

async function write(action: string, at: string, actorId: string, aboutId: string | null) {
  await sql`insert into access_log ${sql({
    school_id: school.id,
    actor_id: actorId,
    actor_role: actorId === admin.personId ? 'admin' : 'teacher',
    action,
    subject_kind: 'person',
    about_person_id: aboutId,
    at,
  })}`;
}

// The school is in Chicago: 04:30 UTC on the 2nd is still the 1st there.
await write('roster.read', '2026-11-01T15:00:00Z', teacher.personId, student.personId);
await write('passphrase.reset', '2026-11-02T05:30:00Z', teacher.personId, student.personId);
await write('term.change', '2026-11-02T15:00:00Z', admin.personId, null);

const actionsOf = async (filter: Record<string, unknown>) => {
  const read = await readLog(admin, filter);
  return read.ok
    ? read.value.entries.map(({ action }) => action).filter((action) => action !== 'log.read')
    : read;
};

it('shows who did what to whom, the newest first, and logs the look itself', async () => {
  const read = await readLog(admin, {});
  expect(read).toMatchObject({
    ok: true,
    value: {
      timeZone: 'America/Chicago',
      total: 3,
      entries: [
        { action: 'term.change', actor: { name: 'Ada Whitehorse', role: 'admin' }, about: null },
        {
          action: 'passphrase.reset',
          actor: { name: 'Noor Castellanos', role: 'teacher' },
          about: { personId: student.personId, name: 'Wayra Quispe' },
        },
        { action: 'roster.read' },
      ],
      choices: { actions: ['passphrase.reset', 'roster.read', 'term.change'] },
    },
  });
  expect(await readLog(admin, { action: 'log.read' })).toMatchObject({ value: { total: 1 } });
});

it('finds by action, by who acted and by whom it was about', async () => {
  expect(await actionsOf({ action: 'roster.read' })).toEqual(['roster.read']);
  expect(await actionsOf({ actorId: teacher.personId })).toEqual(['passphrase.reset', 'roster.read']);
  expect(await actionsOf({ aboutPersonId: student.personId })).toEqual(['passphrase.reset', 'roster.read']);
});

it('counts days as the school’s clock does', async () => {
  expect(await actionsOf({ from: '2026-11-01', to: '2026-11-01' })).toEqual([
    'passphrase.reset',
    'roster.read',
  ]);
  expect(await actionsOf({ from: '2026-11-02', to: '2026-11-02' })).toEqual(['term.change']);
});

it('refuses days in the wrong order and what is no day', async () => {
  expect(await readLog(admin, { from: '2026-11-02', to: '2026-11-01' })).toMatchObject({
    problem: { code: 'invalid' },
  });
  expect(await readLog(admin, { from: 'yesterday' })).toMatchObject({ problem: { code: 'invalid' } });
});

it('is the admin’s alone, and each school’s own', async () => {
  for (const role of ['teacher', 'student', 'head', 'aide'] as const) {
    expect(await readLog(await makeActor(school, role), {})).toMatchObject({
      problem: { code: 'forbidden' },
    });
  }
  const stranger = await makeActor(await makeSchool('Ardmore Academy'), 'admin');
  expect(await readLog(stranger, {})).toMatchObject({ ok: true, value: { total: 0 } });
});

it('gives a page of fifty at a time', async () => {
  const own = await makeSchool();
  const boss = await makeActor(own, 'admin');
  await sql`
    insert into access_log (school_id, actor_id, action, subject_kind, at)
    select ${own.id}, ${boss.personId}, 'term.change', 'term', now() - n * interval '1 hour' from generate_series(1, 51) n`;
  const second = await readLog(boss, { page: 2 });
  expect(second).toMatchObject({ value: { total: 51, page: 2, pageCount: 2 } });
  expect(second.ok && second.value.entries).toHaveLength(1);
});

it('names the practical of an entry, and of a sitting its practical and period', async () => {
  const { teacher, sittingId, practical, school: other } = await stageRound();
  value(await readSitting(teacher, { sittingId }));
  value(await archivePractical(teacher, { practicalId: practical.practicalId, archived: true }));
  const { entries } = value(await readLog(await makeActor(other, 'admin'), {}));
  expect(entries.map(({ action, subjectName }) => [action, subjectName])).toEqual([
    ['practical.change', 'Nine parts'],
    ['sitting.read', 'Nine parts, period 3'],
  ]);
});
