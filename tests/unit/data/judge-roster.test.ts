import { describe, expect, it } from 'vitest';
import { readRoster } from '@/lib/csv/read-roster';
import { type JudgedLine, judgeRoster, type KnownPerson } from '@/lib/data/sections/judge-roster';
import { madeIds } from '@/lib/data/sections/local-ids';
import { changesAnything, planImport } from '@/lib/data/sections/plan-import';

function person(localId: string | null, familyName: string, more: Partial<KnownPerson> = {}): KnownPerson {
  return {
    personId: `person ${familyName}`,
    localId,
    familyName,
    givenName: 'Ana',
    barred: null,
    mine: true,
    enrolled: 'now',
    ...more,
  };
}

function judge(text: string, known: KnownPerson[], kind: 'csv' | 'names' = 'csv'): JudgedLine[] {
  const read = readRoster({ kind, text: kind === 'csv' ? `ID,family name,given name\n${text}` : text });
  if (!read.ok) throw new Error(read.reason);
  return judgeRoster(read.lines, known);
}

const kinds = (lines: JudgedLine[]) => lines.map(({ verdict }) => verdict.kind);

describe('judgeRoster', () => {
  it.each([
    ['nobody has the ID', [], 'new'],
    ['the student is on the roster', [person('007', 'Abara')], 'unchanged'],
    ['the student is in another section', [person('007', 'Abara', { enrolled: null })], 'joins'],
    ['the student had left this section', [person('007', 'Abara', { enrolled: 'earlier' })], 'returns'],
    ['the ID belongs to another name', [person('007', 'Ito')], 'name-conflict'],
    ['the name is on the roster under another ID', [person('W0001', 'Abara')], 'id-conflict'],
    ['a namesake is in another section', [person('W0001', 'Abara', { enrolled: null })], 'new'],
    [
      'the ID belongs to somebody who left the school',
      [person('007', 'Abara', { barred: 'left' })],
      'problem',
    ],
    [
      'the ID belongs to somebody who works here',
      [person('007', 'Abara', { barred: 'works here' })],
      'problem',
    ],
    ['capitals differ alone', [person('007', 'ABARA')], 'unchanged'],
  ] as const)('when %s, a line with an ID is judged by it', (_, known, kind) => {
    expect(kinds(judge('007,Abara,Ana', [...known]))).toEqual([kind]);
  });

  it.each([
    ['a new name gets an ID', [person('007', 'Ito')], 'new'],
    ['a name on the roster is that student', [person('007', 'Abara')], 'unchanged'],
    ['a name that left the section is back', [person('007', 'Abara', { enrolled: 'earlier' })], 'returns'],
    [
      'a name of the school outside the section is not taken for the same',
      [person('007', 'Abara', { enrolled: null })],
      'new',
    ],
    [
      'a name that two students of the section have needs an ID',
      [person('007', 'Abara'), person('008', 'Abara')],
      'problem',
    ],
  ] as const)('without an ID, %s', (_, known, kind) => {
    expect(kinds(judge('Abara, Ana', [...known], 'names'))).toEqual([kind]);
  });

  it('does not take a namesake for the same student when both IDs are in the text', () => {
    expect(kinds(judge('007,Abara,Ana\n008,Abara,Ana', [person('007', 'Abara')]))).toEqual([
      'unchanged',
      'new',
    ]);
  });
});

describe('planImport', () => {
  const conflict = () => judge('007,Abara,Ana', [person('007', 'Ito')]);

  it.each([
    ['keep', { unchanged: 1 }],
    ['rename', { renamed: 1 }],
    ['skip', { leftOut: 1 }],
  ] as const)('does with a name conflict what was chosen: %s', (choice, counts) => {
    const planned = planImport(conflict(), { 2: choice }, false);
    if (!planned.ok) throw new Error('the plan was refused');
    const { renamed, unchanged, leftOut } = planned.plan;
    expect({ renamed: renamed.length, unchanged, leftOut }).toEqual({
      renamed: 0,
      unchanged: 0,
      leftOut: 0,
      ...counts,
    });
    expect(changesAnything(planned.plan)).toBe(choice === 'rename');
  });

  it('names the line of a conflict that nobody decided, or decided by what is not offered', () => {
    expect(planImport(conflict(), {}, false)).toMatchObject({
      ok: false,
      fields: { 'choices.2': [expect.any(String)] },
    });
    const foreign = judge('007,Abara,Ana', [person('007', 'Ito', { mine: false, enrolled: null })]);
    expect(planImport(foreign, { 2: 'rename' }, false).ok).toBe(false);
    expect(planImport(foreign, { 2: 'keep' }, false)).toMatchObject({
      ok: true,
      plan: { enrolled: [{ localId: '007' }] },
    });
  });

  it.each([
    ['renumber', { renumbered: 1, added: 0 }],
    ['add', { renumbered: 0, added: 1 }],
  ] as const)('does with a second ID what was chosen: %s', (choice, counts) => {
    const planned = planImport(judge('007,Abara,Ana', [person('W0001', 'Abara')]), { 2: choice }, false);
    if (!planned.ok) throw new Error('the plan was refused');
    expect({ renumbered: planned.plan.renumbered.length, added: planned.plan.added.length }).toEqual(counts);
  });

  it('gives one student one new ID', () => {
    const lines = judge('007,Abara,Ana\n008,Abara,Ana', [person('W0001', 'Abara')]);
    expect(planImport(lines, { 2: 'renumber', 3: 'renumber' }, false)).toMatchObject({
      ok: false,
      fields: { 'choices.3': [expect.stringContaining('new ID already')] },
    });
  });

  it('holds the import up for a row with a problem until it is to be left out', () => {
    const lines = judge('=1,Abara,Ana\n008,Ito,Ana', []);
    expect(planImport(lines, {}, false)).toMatchObject({
      ok: false,
      fields: { 'choices.2': [expect.any(String)] },
    });
    expect(planImport(lines, {}, true)).toMatchObject({
      ok: true,
      plan: { leftOut: 1, added: [{ localId: '008' }] },
    });
  });
});

describe('madeIds', () => {
  it('counts on after the highest number of the school', () => {
    expect(madeIds(['W0007', '00417'], 2)).toEqual(['W0008', 'W0009']);
    expect(madeIds([], 1)).toEqual(['W0001']);
    expect(madeIds(['W9999'], 1)).toEqual(['W10000']);
  });
});
