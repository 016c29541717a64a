import { expect, it } from 'vitest';
import { readSchoolUnit } from '@/lib/data/practicals/read-school-unit';
import { ownerSql } from '@/tests/support/database';
import { makeActor, makeSchool } from '@/tests/support/school';

it('a new practical begins in the unit of the teacher’s school, and other roles are not told', async () => {
  const [inches, metric] = [await makeSchool(), await makeSchool('Ardmore Academy')];
  await ownerSql()`update schools set unit = 'mm' where id = ${metric.id}`;
  expect(await readSchoolUnit(await makeActor(inches, 'teacher'), {})).toEqual({ ok: true, value: 'in' });
  expect(await readSchoolUnit(await makeActor(metric, 'teacher'), {})).toEqual({ ok: true, value: 'mm' });
  for (const role of ['aide', 'student'] as const) {
    expect(await readSchoolUnit(await makeActor(metric, role), {})).toMatchObject({
      problem: { code: 'forbidden' },
    });
  }
});
