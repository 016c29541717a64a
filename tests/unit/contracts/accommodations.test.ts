import { randomUUID } from 'node:crypto';
import { parseWithZod } from '@conform-to/zod/v4';
import { describe, expect, it } from 'vitest';
import { accommodationForm, excusedKey, modificationForm } from '@/lib/contracts/accommodations';
import type { Modification } from '@/lib/scoring/modification';
import { sayModification } from '@/lib/scoring/modification-words';

const sectionId = randomUUID();
const studentId = randomUUID();

/** What a browser sends of the form. */
function sent(fields: [string, string][]) {
  const data = new FormData();
  const always: [string, string][] = [
    ['sectionId', sectionId],
    ['studentId', studentId],
    ['sittingId', ''],
    ['replaces', ''],
    ['reason', ' splint '],
  ];
  for (const [name, value] of [...always, ...fields]) data.append(name, value);
  return parseWithZod(data, { schema: accommodationForm });
}

describe('the form of a modified rubric', () => {
  it('reads what stands in its fields into what the verb takes', () => {
    const submission = sent([
      ['widen', '1 1/2'],
      ['excused', 'base/*'],
      ['excused', '*/width'],
      ['excused', 'hook/length'],
      ['checks[0].label', 'square'],
      ['checks[0].as', 'priced'],
      ['checks[0].lose[0]', '0,5'],
      ['checks[1].label', 'surface'],
      ['checks[1].as', 'rubric'],
      ['checks[2].label', 'labelled'],
      ['checks[2].as', 'not held'],
    ]);
    expect(submission.status === 'success' && submission.value).toEqual({
      ...{ sectionId, studentId, sittingId: null, replaces: null, reason: 'splint' },
      modification: {
        format: 1,
        widen: { num: 3, den: 2 },
        excused: [
          { lineId: 'base', axis: null },
          { lineId: null, axis: 'width' },
          { lineId: 'hook', axis: 'length' },
        ],
        checks: [
          { label: 'square', lose: [0, 50] },
          { label: 'labelled', lose: null },
        ],
      },
    });
  });

  it('takes one box and no factor', () => {
    const submission = sent([['excused', '*/length']]);
    expect(submission.status === 'success' && submission.value.modification).toEqual({
      format: 1,
      widen: { num: 1, den: 1 },
      excused: [{ lineId: null, axis: 'length' }],
      checks: [],
    });
  });

  it('tells each field what is wrong with it, and keeps what was typed', () => {
    const submission = sent([
      ['widen', 'wide'],
      ['checks[0].label', 'square'],
      ['checks[0].as', 'priced'],
      ['checks[0].lose[0]', 'some'],
    ]);
    const { error, initialValue } = submission.reply();
    expect(error).toEqual({
      widen: [expect.stringContaining('cannot be read')],
      'checks[0].lose[0]': ['Type points, such as 1 or 0.5.'],
    });
    expect(initialValue).toMatchObject({ widen: 'wide', reason: ' splint ' });
  });

  it('asks for a student and a reason', () => {
    const data = new FormData();
    data.append('sectionId', sectionId);
    expect(Object.keys(parseWithZod(data, { schema: accommodationForm }).reply().error ?? {})).toEqual([
      'studentId',
      'reason',
    ]);
  });

  it('names every box so that it reads back', () => {
    const boxes: Modification['excused'] = [
      { lineId: 'a-1', axis: null },
      { lineId: null, axis: 'thickness' },
      { lineId: 'a-1', axis: 'width' },
    ];
    const excused = boxes.map(({ lineId, axis }) => excusedKey(lineId, axis));
    expect(modificationForm.parse({ excused }).excused).toEqual(boxes);
    expect(modificationForm.safeParse({ excused: [excusedKey(null, null)] }).success).toBe(false);
  });
});

describe('a modification in words', () => {
  const lines = [
    { lineId: 'base', label: 'base' },
    { lineId: 'hook', label: 'hook' },
    { lineId: 'guide', label: 'guide' },
  ];

  it('gives the example of its description', () => {
    expect(sayModification({ format: 1, widen: { num: 3, den: 2 }, excused: [], checks: [] }, [])).toEqual([
      'bands 1.5 times as wide',
    ]);
  });

  it('names bands, lines, axes and checks, and leaves out lines that are not there', () => {
    const modification: Modification = {
      format: 1,
      widen: { num: 1, den: 1 },
      excused: [
        { lineId: 'base', axis: null },
        { lineId: 'guide', axis: null },
        { lineId: 'door', axis: null },
        { lineId: null, axis: 'width' },
        { lineId: 'hook', axis: 'length' },
      ],
      checks: [
        { label: 'square', lose: [0, 50, 100] },
        { label: 'surface', lose: null },
      ],
    };
    expect(sayModification(modification, lines)).toEqual([
      'base and guide excused',
      'width of every line excused',
      'length of hook excused',
      'square loses 0.5, 1',
      'surface excused',
    ]);
  });
});
