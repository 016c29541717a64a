import { expect, test } from 'vitest';
import { rebuildSheets } from '@/lib/data/rounds/rebuild-sheets';
import { inSchoolAs, ownerSql } from '../../support/database';
import { push } from '../../support/push-events';
import { eventOf, stageRound } from '../../support/round-stage';

test('sheets, standings and days late can be rebuilt from the events alone, for many attempts at once', async () => {
  const { teacher, students, sittingId, attempts, school } = await stageRound();
  const at = (what: string) => ({ lineId: '', ordinal: 0, what });
  await push(teacher, sittingId, [
    eventOf(teacher, attempts[0]),
    eventOf(teacher, attempts[0], { cell: at('@days-late'), value: { kind: 'days-late', days: 2 } }),
    eventOf(teacher, attempts[1], { cell: at('@standing'), value: { kind: 'standing', standing: 'absent' } }),
  ]);
  await push(students[0], sittingId, [eventOf(students[0], attempts[0], { side: 'own' })]);
  const stored = () => ownerSql()`
    select s.attempt_id, side, recorded, sheet, score_points, lost_points, complete, conflicts, measured_at, standing, days_late
    from score_sheets s join attempts a on a.id = s.attempt_id where sitting_id = ${sittingId} order by 1, 2`;
  const before = await stored();
  expect(before).toHaveLength(3);
  await ownerSql()`update score_sheets set lost_points = 7, sheet = '{}' where school_id = ${school.id}`;
  await ownerSql()`update attempts set standing = 'zero', days_late = 9 where sitting_id = ${sittingId}`;
  await inSchoolAs(school.id, (tx) => rebuildSheets(tx, school.id, attempts));
  expect(await stored()).toEqual(before);
});

test('a sheet of a side without events goes', async () => {
  const { sittingId, attempts, school, practical } = await stageRound();
  await ownerSql()`
    insert into score_sheets (school_id, attempt_id, side, rubric_version_id, engine_version, recorded, sheet,
      total_points, lost_points, complete, conflicts, finished)
    values (${school.id}, ${attempts[0]}, 'bench', ${practical.versionId}, 1, '{}', '{}', 1, 1, true, 0, true)`;
  await inSchoolAs(school.id, (tx) => rebuildSheets(tx, school.id, attempts));
  const rows = await ownerSql()`
    select 1 from score_sheets s join attempts a on a.id = s.attempt_id where sitting_id = ${sittingId}`;
  expect(rows).toHaveLength(0);
});
