import { readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import { exportPractical } from '@/lib/data/practicals/export-practical';
import { importPractical } from '@/lib/data/practicals/import-practical';
import { offerPractical } from '@/lib/data/practicals/offer-practical';
import { readPractical } from '@/lib/data/practicals/read-practical';
import { readVersionSheet } from '@/lib/data/practicals/read-version-sheet';
import { starterDraft } from '@/lib/practicals/starters';
import { code, fieldsOf, value } from '@/tests/support/answers';
import { ownerSql } from '@/tests/support/database';
import { changeDraft, countPracticals, makeStarter, publishDraft } from '@/tests/support/practicals';
import { logOf, makeActor, makeSchool, whileLogFails } from '@/tests/support/school';

const school = await makeSchool();
const teacher = await makeActor(school, 'teacher');
const elsewhere = await makeSchool('Ardmore Academy');
const colleague = await makeActor(elsewhere, 'teacher');
const example = readFileSync('tests/support/data/bench-hook.practical.json', 'utf8');

describe('taking a practical out as a file', () => {
  it('writes a version as it was published, the same each time, and logs it', async () => {
    const practicalId = await makeStarter(teacher, 'desk-caddy');
    await publishDraft(teacher, practicalId);
    await changeDraft(teacher, practicalId, (draft) => {
      draft.kerf = 'thin';
    });
    const file = value(await exportPractical(teacher, { practicalId, version: 1 }));
    expect(file.fileName).toBe('desk-caddy-version-1.practical.json');
    const { task, form } = value(await readVersionSheet(teacher, { practicalId, number: 1 }));
    expect(JSON.parse(file.text)).toEqual({ trymark: 'practical', version: 1, task, form });
    expect(value(await exportPractical(teacher, { practicalId, version: 1 })).text).toBe(file.text);
    expect(await logOf(school)).toContainEqual(
      expect.objectContaining({
        action: 'version.read',
        details: { exported: 'Desk caddy', version: 1, file: file.fileName },
      }),
    );
  });

  it('writes the draft once it can be read, and until then names the fields that cannot', async () => {
    const practicalId = await makeStarter(teacher, 'wall-rack');
    expect(value(await exportPractical(teacher, { practicalId, version: null })).fileName).toBe(
      'wall-rack-draft.practical.json',
    );
    await changeDraft(teacher, practicalId, (draft) => {
      Object.assign(draft.lines[0] ?? {}, { width: 'wide' });
      draft.reading.margin = '';
    });
    const refused = await exportPractical(teacher, { practicalId, version: null });
    expect(fieldsOf(refused)).toEqual(['lines.0.width', 'reading.margin']);
    expect(!refused.ok && refused.problem.message).toBe(
      'The draft cannot be written to a file yet. Put right: line 1, width; reading, reading margin.',
    );
  });

  it('gives a version to whoever may read it, and a draft to its owner alone', async () => {
    const practicalId = await makeStarter(teacher, 'gauge-kit');
    await publishDraft(teacher, practicalId);
    const other = await makeActor(school, 'teacher');
    const head = await makeActor(school, 'head');
    expect(code(await exportPractical(other, { practicalId, version: 1 }))).toBe('not_found');
    value(await offerPractical(teacher, { practicalId, offered: true }));
    expect(code(await exportPractical(other, { practicalId, version: 1 }))).toBe('ok');
    expect(code(await exportPractical(other, { practicalId, version: null }))).toBe('not_found');
    expect(code(await exportPractical(head, { practicalId, version: 1 }))).toBe('ok');
    expect(code(await exportPractical(head, { practicalId, version: null }))).toBe('not_found');
    expect(code(await exportPractical(colleague, { practicalId, version: 1 }))).toBe('not_found');
    expect(code(await exportPractical(teacher, { practicalId, version: 2 }))).toBe('not_found');
    expect(code(await exportPractical(teacher, { practicalId, version: Number.NaN }))).toBe('invalid');
    for (const role of ['admin', 'aide', 'student'] as const) {
      const actor = await makeActor(school, role);
      expect(code(await exportPractical(actor, { practicalId, version: 1 }))).toBe('forbidden');
    }
  });

  it('gives no file that the log does not know of', async () => {
    const practicalId = await makeStarter(teacher);
    const failed = await whileLogFails(() => exportPractical(teacher, { practicalId, version: null }));
    expect(failed).toBeInstanceOf(Error);
  });
});

describe('making a practical from a file', () => {
  it('makes a draft of the importer’s own with the very same task and prices, taken from nowhere', async () => {
    const out = await makeStarter(teacher, 'six-stick');
    await publishDraft(teacher, out);
    const { text } = value(await exportPractical(teacher, { practicalId: out, version: 1 }));
    const { practicalId } = value(await importPractical(colleague, { text }));
    const view = value(await readPractical(colleague, { practicalId }));
    expect(view).toMatchObject({ title: 'Six-stick puzzle', versions: [], latest: null, source: null });
    expect(view.draft.content).toEqual(starterDraft('six-stick'));
    const [row] = await ownerSql()`
      select school_id, owner_id, copied_from_version_id, source_kind, offered_at from practicals
      where id = ${practicalId}`;
    expect(row).toEqual({
      school_id: elsewhere.id,
      owner_id: colleague.personId,
      copied_from_version_id: null,
      source_kind: null,
      offered_at: null,
    });
    await publishDraft(colleague, practicalId);
    expect(value(await exportPractical(colleague, { practicalId, version: 1 })).text).toBe(text);
    expect(await logOf(elsewhere)).toContainEqual(
      expect.objectContaining({ action: 'practical.create', details: { imported: 'Six-stick puzzle' } }),
    );
  });

  it('takes the worked example in', async () => {
    const { practicalId } = value(await importPractical(teacher, { text: example }));
    expect(value(await exportPractical(teacher, { practicalId, version: null })).text).toBe(example);
  });

  it('makes nothing when a single place is wrong, and names each', async () => {
    const before = await countPracticals(school);
    const text = example.replace('"kerf": 31750000', '"kerf": 0').replace('"max": 20', '"max": 1');
    const refused = await importPractical(teacher, { text });
    expect(code(refused)).toBe('invalid');
    expect(fieldsOf(refused)).toEqual(['task.kerf', 'form.policies.late.max']);
    expect(!refused.ok && refused.problem.fields?.['task.kerf']).toEqual([
      'Line 14, column 13: This is more than 0.',
    ]);
    expect(code(await importPractical(teacher, { text: '' }))).toBe('invalid');
    expect(code(await importPractical(teacher, { text: ' '.repeat(1_000_001) }))).toBe('invalid');
    expect(code(await importPractical(teacher, { text: 7 }))).toBe('invalid');
    expect(await countPracticals(school)).toEqual(before);
  });

  it('is for teachers alone', async () => {
    for (const role of ['head', 'admin', 'aide', 'student'] as const) {
      expect(code(await importPractical(await makeActor(school, role), { text: example }))).toBe('forbidden');
    }
    expect(code(await importPractical(null, { text: example }))).toBe('unauthenticated');
  });

  it('makes nothing when the log cannot be written', async () => {
    const before = await countPracticals(school);
    await whileLogFails(() => importPractical(teacher, { text: example }));
    expect(await countPracticals(school)).toEqual(before);
  });
});
