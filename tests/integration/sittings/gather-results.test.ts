import { expect, test } from 'vitest';
import { lockAttempts } from '@/db/queries/rounds';
import { rebuildSheets } from '@/lib/data/rounds/rebuild-sheets';
import { previewPublication } from '@/lib/data/sittings/preview-publication';
import { value } from '@/tests/support/answers';
import { inSchoolAs } from '@/tests/support/database';
import { push } from '@/tests/support/push-events';
import { eventOf, sheetOf, stageRound } from '@/tests/support/round-stage';
import { untilWaiting } from '@/tests/support/waiting';

test('a reading that is being kept while somebody looks at the results is in the sheet afterwards', async () => {
  const { teacher, sittingId, attempts, school } = await stageRound();
  const short = eventOf(teacher, attempts[0]);
  await push(teacher, sittingId, [short]);
  expect(await sheetOf(attempts[0])).toMatchObject({ lost_points: 100 });
  const better = { id: crypto.randomUUID(), value: '{"kind":"gauged"}', sequence: short.sequence + 100_000 };
  const looked = await inSchoolAs(school.id, async (tx) => {
    await lockAttempts(tx, school.id, sittingId, [attempts[0]]);
    await tx.execute(`
      insert into reading_events (school_id, id, sitting_id, attempt_id, side, line_id, ordinal, what, value,
        supersedes, device_id, sequence, captured_at, author_id, sender_id)
      select school_id, '${better.id}', sitting_id, attempt_id, side, line_id, ordinal, what, '${better.value}',
        array[id], device_id, ${better.sequence}, captured_at, author_id, sender_id
      from reading_events where id = '${short.id}'`);
    await rebuildSheets(tx, school.id, [attempts[0]]);
    const looking = previewPublication(teacher, { sittingId });
    await untilWaiting();
    return { looking };
  });
  expect(value(await looked.looking)).toMatchObject({ incomplete: [{ givenName: 'Ana' }] });
  expect(await sheetOf(attempts[0])).toMatchObject({ lost_points: 0 });
});
