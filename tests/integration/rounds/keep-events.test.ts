import { randomUUID } from 'node:crypto';
import { beforeAll, describe, expect, test } from 'vitest';
import { deriveAttempt } from '@/lib/sync/derive';
import { ownerSql } from '../../support/database';
import { giveAide, makePractical, makeSitting } from '../../support/factories';
import { outcomes, push } from '../../support/push-events';
import { eventOf, type RoundStage, sheetOf, stageRound, storedEvents } from '../../support/round-stage';
import { ticksOf } from '../../support/rubrics';
import { logOf, makeActor, makeSchool } from '../../support/school';

let stage: RoundStage;
beforeAll(async () => {
  stage = await stageRound();
});

/** A fresh round for tests that look at a whole sheet. */
const fresh = stageRound;

describe('keeping events', () => {
  test('a reading is kept as typed, with author, sender and time, and the sheet follows in the same breath', async () => {
    const { teacher, sittingId, attempts, school } = await fresh();
    const event = eventOf(teacher, attempts[0]);
    expect(await outcomes(push(teacher, sittingId, [event]))).toEqual(['kept']);
    const [stored] = await ownerSql()`select * from reading_events where id = ${event.id}`;
    expect(stored).toMatchObject({
      typed: '6 15/16',
      unit: 'in',
      instrument: 'rule',
      reading_ticks: String(ticksOf('6 15/16')),
      author_id: teacher.personId,
      sender_id: teacher.personId,
      captured_at: new Date(event.capturedAt),
    });
    // 6 15/16 for 7 is 1/16 under: one point.
    expect(await sheetOf(attempts[0])).toMatchObject({ lost_points: 100, complete: false, conflicts: 0 });
    expect((await logOf(school)).at(-1)).toMatchObject({
      action: 'round.record',
      actor_id: teacher.personId,
      details: { kept: 1, attempts: [attempts[0]] },
    });
  });

  test('a repeated push is answered “already” and changes nothing', async () => {
    const { teacher, sittingId, attempts } = await fresh();
    const events = [eventOf(teacher, attempts[0]), eventOf(teacher, attempts[1])];
    expect(await outcomes(push(teacher, sittingId, events))).toEqual(['kept', 'kept']);
    expect(await outcomes(push(teacher, sittingId, events))).toEqual(['already', 'already']);
    expect(await outcomes(push(teacher, sittingId, [...events, ...events]))).toHaveLength(4);
    expect(await storedEvents(attempts[0])).toHaveLength(1);
  });

  test('another reading under an id that was used is refused, in one batch too', async () => {
    const { teacher, sittingId, attempts } = stage;
    const event = eventOf(teacher, attempts[0]);
    const other = { ...event, typed: '7', value: { kind: 'value' as const, ticks: ticksOf('7') } };
    const [first, second] = await outcomes(push(teacher, sittingId, [event, other]));
    expect(first).toBe('kept');
    expect(second).toMatch(/^refused: Another reading was already kept/);
    expect(await outcomes(push(teacher, sittingId, [{ ...event, sequence: 900_001 }]))).toEqual([
      expect.stringMatching(/^refused: Another reading/),
    ]);
  });

  test('a number of the device that was used for another reading is refused', async () => {
    const { teacher, sittingId, attempts } = stage;
    const event = eventOf(teacher, attempts[0]);
    await push(teacher, sittingId, [event]);
    const [answer] = await outcomes(
      push(teacher, sittingId, [eventOf(teacher, attempts[0], { sequence: event.sequence })]),
    );
    expect(answer).toMatch(/two devices share one store/);
  });

  test.each([
    ['an unknown line', { cell: { lineId: 'lid', ordinal: 1, what: 'length' } }, /no line “lid”/],
    ['an ordinal past the quantity', { cell: { lineId: 'end', ordinal: 3, what: 'length' } }, /no number 3/],
    ['an unknown check', { cell: { lineId: 'end', ordinal: 1, what: 'polish' } }, /no check “polish”/],
    [
      'a level that the check does not have',
      { cell: { lineId: 'end', ordinal: 1, what: 'square' }, value: { kind: 'level', level: 2 } },
      /no such level/,
    ],
    ['a size of nothing', { value: { kind: 'value', ticks: 0 } }, /cannot be read/],
    ['a size past ten metres', { value: { kind: 'value', ticks: 100_000_000_001 } }, /cannot be read/],
    ['half a tick', { value: { kind: 'value', ticks: 1.5 } }, /cannot be read/],
    ['a reading without its unit', { unit: null }, /needs what was typed/],
    ['text that cannot be stored', { typed: '6\u0000' }, /cannot be kept/],
    ['a bench cell marked “couldn’t read”', { value: { kind: 'unreadable' } }, /cannot be recorded as that/],
    ['an unknown key', { colour: 'red' }, /cannot be read/],
    ['a unit in capitals', { unit: 'IN' }, /cannot be read/],
    ['an attempt of nowhere', { attemptId: randomUUID() }, /not in this round/],
  ])('%s is refused with its reason and holds up no other', async (_, change, reason) => {
    const { teacher, sittingId, attempts } = stage;
    const wrong = { ...eventOf(teacher, attempts[0]), ...change };
    const right = eventOf(teacher, attempts[1]);
    const answers = await outcomes(push(teacher, sittingId, [wrong, right]));
    expect(answers[0]).toMatch(reason);
    expect(answers[1]).toBe('kept');
  });

  test('only the author’s own session sends an event', async () => {
    const { teacher, aide, sittingId, attempts } = stage;
    const [answer] = await outcomes(push(aide, sittingId, [eventOf(teacher, attempts[0])]));
    expect(answer).toMatch(/^refused: Only the person who recorded this/);
  });

  test('another protocol version, an empty batch and an event without an id are refused whole', async () => {
    const { teacher, sittingId, attempts } = stage;
    const event = eventOf(teacher, attempts[0]);
    for (const pushed of [
      push(teacher, sittingId, [event], { protocol: 2 }),
      push(teacher, sittingId, []),
      push(teacher, sittingId, [event, { hello: 'there' }]),
    ]) {
      expect(await pushed).toMatchObject({ ok: false, problem: { code: 'invalid' } });
    }
    expect((await storedEvents(attempts[0])).some(({ id }) => id === event.id)).toBe(false);
  });
});

describe('who may record', () => {
  test('nobody signed out, no admin, no head, no teacher of another section or school', async () => {
    const { school, sittingId, teacher, attempts } = stage;
    const events = [eventOf(teacher, attempts[0])];
    const elsewhere = await makeSchool('Ardmore Academy');
    expect(await push(null, sittingId, events)).toMatchObject({ problem: { code: 'unauthenticated' } });
    expect(await push(await makeActor(school, 'admin'), sittingId, events)).toMatchObject({
      problem: { code: 'forbidden' },
    });
    expect(await push(await makeActor(school, 'head'), sittingId, events)).toMatchObject({
      problem: { code: 'forbidden' },
    });
    for (const stranger of [await makeActor(school, 'teacher'), await makeActor(elsewhere, 'teacher')]) {
      expect(await push(stranger, sittingId, events)).toMatchObject({ problem: { code: 'not_found' } });
    }
  });

  test('an attempt of another sitting is refused even to the teacher of both', async () => {
    const { school, teacher, students, sectionId, sittingId } = await fresh();
    const other = await makeSitting(school, sectionId, await makePractical(school, teacher.personId), {
      openedBy: teacher.personId,
      studentIds: [students[0].personId],
    });
    const attemptId = other.attempts.get(students[0].personId) ?? '';
    const [answer] = await outcomes(push(teacher, sittingId, [eventOf(teacher, attemptId)]));
    expect(answer).toMatch(/not in this round/);
  });

  test('an aide records, but neither finishes, excuses nor chooses between two readings', async () => {
    const { teacher, aide, sittingId, attempts } = await fresh();
    const mine = eventOf(aide, attempts[0]);
    const finish = eventOf(aide, attempts[0], {
      cell: { lineId: '', ordinal: 0, what: '@finish' },
      value: { kind: 'finish', done: true },
    });
    const excuse = eventOf(aide, attempts[0], { value: { kind: 'excused' } });
    const absent = eventOf(aide, attempts[1], {
      cell: { lineId: '', ordinal: 0, what: '@standing' },
      value: { kind: 'standing', standing: 'absent' },
    });
    const answers = await outcomes(push(aide, sittingId, [mine, finish, excuse, absent]));
    expect(answers).toEqual([
      'kept',
      'refused: Only the teacher of the section does that.',
      'refused: Only the teacher of the section does that.',
      'kept',
    ]);
    const theirs = eventOf(teacher, attempts[0], { value: { kind: 'gauged' }, typed: null, unit: null });
    await push(teacher, sittingId, [theirs]);
    const choice = eventOf(aide, attempts[0], { supersedes: [mine.id, theirs.id] });
    expect(await outcomes(push(aide, sittingId, [choice]))).toEqual([
      'refused: Only the teacher of the section chooses between two readings.',
    ]);
    const [row] = await ownerSql()`select standing from attempts where id = ${attempts[1]}`;
    expect(row?.standing).toBe('absent');
  });

  test('an aide takes back nothing that the teacher alone may record', async () => {
    const { teacher, aide, sittingId, attempts } = await fresh();
    const at = (what: string) => ({
      cell: { lineId: '', ordinal: 0, what },
      typed: null,
      unit: null,
      instrument: null,
    });
    const decided = [
      eventOf(teacher, attempts[0], { ...at('@finish'), value: { kind: 'finish', done: true } }),
      eventOf(teacher, attempts[0], { ...at('@days-late'), value: { kind: 'days-late', days: 3 } }),
      eventOf(teacher, attempts[0], { ...at('@standing'), value: { kind: 'standing', standing: 'zero' } }),
    ];
    await push(teacher, sittingId, decided);
    const back = decided.map(({ id, cell }) =>
      eventOf(aide, attempts[0], { ...at(cell.what), value: { kind: 'cleared' }, supersedes: [id] }),
    );
    const expected = eventOf(aide, attempts[0], {
      ...at('@standing'),
      value: { kind: 'standing', standing: 'expected' },
      supersedes: [decided[2]?.id ?? ''],
    });
    expect(await outcomes(push(aide, sittingId, [...back, expected]))).toEqual(
      Array(4).fill('refused: Only the teacher of the section does that.'),
    );
    const [row] = await ownerSql()`select standing, days_late from attempts where id = ${attempts[0]}`;
    expect(row).toMatchObject({ standing: 'zero', days_late: 3 });
    expect(await sheetOf(attempts[0])).toMatchObject({ finished: true, conflicts: 0 });
  });

  test('an aide whose days are over delivers what was recorded, flagged; one never given the section does not', async () => {
    const { school, sectionId, sittingId, attempts } = await fresh();
    const former = await makeActor(school, 'aide');
    await giveAide(school, sectionId, former.personId, { from: -5, to: -3 });
    const early = await makeActor(school, 'aide');
    await giveAide(school, sectionId, early.personId, { from: 3, to: 5 });
    const event = eventOf(former, attempts[0]);
    expect(await outcomes(push(former, sittingId, [event]))).toEqual(['kept']);
    expect((await storedEvents(attempts[0])).map(({ flags }) => flags)).toEqual([['access-ended']]);
    for (const stranger of [early, await makeActor(school, 'aide')]) {
      expect(await push(stranger, sittingId, [eventOf(stranger, attempts[0])])).toMatchObject({
        problem: { code: 'not_found' },
      });
    }
  });
});

describe('two readings of one cell', () => {
  test('differing ones stand against each other until a person chooses; there is no score meanwhile', async () => {
    const { teacher, aide, sittingId, attempts } = await fresh();
    const one = eventOf(teacher, attempts[0]);
    const two = eventOf(aide, attempts[0], { typed: '7', value: { kind: 'value', ticks: ticksOf('7') } });
    await push(teacher, sittingId, [one]);
    await push(aide, sittingId, [two]);
    expect(await sheetOf(attempts[0])).toMatchObject({ conflicts: 1, score_points: null, complete: false });
    const choice = eventOf(teacher, attempts[0], {
      typed: '7',
      value: { kind: 'value', ticks: ticksOf('7') },
      supersedes: [one.id, two.id],
    });
    expect(await outcomes(push(teacher, sittingId, [choice]))).toEqual(['kept']);
    expect(await sheetOf(attempts[0])).toMatchObject({ conflicts: 0, lost_points: 0 });
    expect(await storedEvents(attempts[0])).toHaveLength(3);
  });

  test('equal ones merge by themselves, and a later one replaces the one it names', async () => {
    const { teacher, aide, sittingId, attempts } = await fresh();
    const one = eventOf(teacher, attempts[0]);
    const same = eventOf(aide, attempts[0], { instrument: 'caliper', typed: '6.9375' });
    const later = eventOf(aide, attempts[0], {
      value: { kind: 'gauged' },
      typed: null,
      unit: null,
      supersedes: [one.id, same.id],
    });
    await push(teacher, sittingId, [one]);
    await push(aide, sittingId, [same]);
    expect(await sheetOf(attempts[0])).toMatchObject({ conflicts: 0, lost_points: 100 });
    expect(await outcomes(push(aide, sittingId, [later]))).toEqual(['kept']);
    expect(await sheetOf(attempts[0])).toMatchObject({ conflicts: 0, lost_points: 0 });
  });

  test('batches of two tablets at the same moment are both kept, and the sheet knows both', async () => {
    const { teacher, aide, sittingId, attempts } = await fresh();
    const axes = ['thickness', 'width', 'length'];
    const batch = (who: typeof teacher, lineId: string) =>
      axes.map((what) =>
        eventOf(who, attempts[0], {
          cell: { lineId, ordinal: 1, what },
          value: { kind: 'gauged' },
          typed: null,
          unit: null,
        }),
      );
    const [a, b] = await Promise.all([
      outcomes(push(teacher, sittingId, batch(teacher, 'base'), { deviceId: randomUUID() })),
      outcomes(push(aide, sittingId, batch(aide, 'end'), { deviceId: randomUUID() })),
    ]);
    expect([...a, ...b]).toEqual(Array(6).fill('kept'));
    const [row] = await ownerSql()<{ recorded: { pieces: unknown[] } }[]>`
      select recorded from score_sheets where attempt_id = ${attempts[0]} and side = 'bench'`;
    expect(row?.recorded.pieces).toHaveLength(2);
  });

  test('the same batch pushed twice at the same moment is kept once', async () => {
    const { teacher, sittingId, attempts } = await fresh();
    const events = [eventOf(teacher, attempts[0]), eventOf(teacher, attempts[1])];
    const both = await Promise.all([
      outcomes(push(teacher, sittingId, events)),
      outcomes(push(teacher, sittingId, events)),
    ]);
    expect(both.map((answers) => answers.join()).sort()).toEqual(['already,already', 'kept,kept']);
    expect(await storedEvents(attempts[0])).toHaveLength(1);
  });

  test('a piece called missing on one tablet and measured on another is a conflict; missing that clears its sizes is not', async () => {
    const { teacher, aide, sittingId, attempts } = await fresh();
    const size = eventOf(aide, attempts[0]);
    const missing = eventOf(teacher, attempts[0], {
      cell: { lineId: 'base', ordinal: 1, what: 'piece' },
      value: { kind: 'state', state: 'missing' },
      typed: null,
      unit: null,
    });
    await push(aide, sittingId, [size]);
    await push(teacher, sittingId, [missing]);
    expect(await sheetOf(attempts[0])).toMatchObject({ conflicts: 1, score_points: null });
    const clear = eventOf(teacher, attempts[0], { value: { kind: 'cleared' }, supersedes: [size.id] });
    await push(teacher, sittingId, [clear]);
    expect(await sheetOf(attempts[0])).toMatchObject({ conflicts: 0, lost_points: 900 });
  });
});

describe('one transaction a batch', () => {
  test('when the sheet cannot be stored, neither is the event nor the log entry', async () => {
    const { teacher, sittingId, attempts, school } = await fresh();
    const sql = ownerSql();
    await sql`alter table score_sheets add constraint no_sheets check (school_id <> ${sql.unsafe(`'${school.id}'`)}) not valid`;
    try {
      await expect(push(teacher, sittingId, [eventOf(teacher, attempts[0])])).rejects.toThrow();
    } finally {
      await sql`alter table score_sheets drop constraint no_sheets`;
    }
    expect(await storedEvents(attempts[0])).toEqual([]);
    expect(await logOf(school)).toEqual([]);
  });

  test('what the derivation says of every stored event is what the sheet holds', async () => {
    const { teacher, sittingId, attempts } = await fresh();
    const line = ['thickness', 'width', 'length'] as const;
    const events = line.map((what, index) =>
      eventOf(teacher, attempts[0], {
        cell: { lineId: 'side', ordinal: 2, what },
        value: { kind: 'value', ticks: ticksOf(['1/2', '2 1/16', '6 29/32'][index] ?? '1') },
      }),
    );
    await push(teacher, sittingId, events);
    const [row] = await ownerSql()<{ recorded: unknown }[]>`
      select recorded from score_sheets where attempt_id = ${attempts[0]} and side = 'bench'`;
    expect(row?.recorded).toEqual(deriveAttempt(events, 'bench').attempt);
    expect((await sheetOf(attempts[0]))?.lost_points).toBe(300);
  });
});
