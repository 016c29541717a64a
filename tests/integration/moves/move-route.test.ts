import { beforeAll, beforeEach, describe, expect, test, vi } from 'vitest';
import { GET } from '@/app/api/sittings/[sittingId]/move/route';
import type { Actor } from '@/lib/auth/actor';
import { previewLineSchema } from '@/lib/contracts/move-preview';
import { ownerSql } from '@/tests/support/database';
import { markPieces } from '@/tests/support/mark-pieces';
import { addVersion, dearer, preview } from '@/tests/support/moves';
import { type RoundStage, stageRound } from '@/tests/support/round-stage';

const signedIn = vi.hoisted(() => ({ actor: null as Actor | null }));
vi.mock('@/lib/auth/session', () => ({ currentActor: async () => signedIn.actor }));

let stage: RoundStage;
let versionId: string;

beforeAll(async () => {
  stage = await stageRound();
  versionId = await addVersion(stage, 2, dearer);
  await markPieces(stage.teacher, stage.sittingId, stage.attempts[0], stage.practical.rubric);
});

beforeEach(() => {
  signedIn.actor = stage.teacher;
});

function ask(
  given: { version?: string; signal?: AbortSignal; headers?: HeadersInit } = {},
): Promise<Response> {
  const { version = versionId, ...more } = given;
  const url = `http://127.0.0.1:3000/api/sittings/${stage.sittingId}/move?version=${version}`;
  return GET(new Request(url, more), { params: Promise.resolve({ sittingId: stage.sittingId }) });
}

async function linesOf(response: Response) {
  const text = await response.text();
  expect(text.endsWith('\n')).toBe(true);
  return text
    .trimEnd()
    .split('\n')
    .map((line) => previewLineSchema.parse(JSON.parse(line)));
}

describe('the stream of a move’s preview', () => {
  test('tells how far it has come a line at a time, and ends with the preview', async () => {
    const response = await ask();
    expect(response.status).toBe(200);
    expect(response.headers.get('content-type')).toMatch('application/x-ndjson');
    expect(response.headers.get('cache-control')).toBe('private, no-store, no-transform');
    expect(await linesOf(response)).toEqual([
      { kind: 'progress', done: 0, of: 2 },
      { kind: 'progress', done: 2, of: 2 },
      { kind: 'preview', preview: await preview(stage, versionId) },
    ]);
  });

  test.each([
    ['nobody', () => null, 401],
    ['an aide', () => stage.aide, 403],
    ['a student', () => stage.students[0], 403],
  ])('is refused to %s with a status', async (_, actor, status) => {
    signedIn.actor = actor();
    const response = await ask();
    expect(response.status).toBe(status);
    expect(await response.json()).toMatchObject({ problem: { message: expect.any(String) } });
  });

  test('is refused for a version that is none, to another teacher, and to a page of another site', async () => {
    expect((await ask({ version: 'second' })).status).toBe(422);
    expect((await ask({ version: stage.practical.versionId })).status).toBe(422);
    expect((await ask({ headers: { 'sec-fetch-site': 'cross-site' } })).status).toBe(403);
    signedIn.actor = (await stageRound()).teacher;
    expect((await ask()).status).toBe(404);
  });

  test('ends with the problem when the database goes away in the middle', async () => {
    const sql = ownerSql();
    await sql`alter table score_sheets rename column recorded to taken_away`;
    const response = await ask();
    const last = (await linesOf(response)).at(-1);
    await sql`alter table score_sheets rename column taken_away to recorded`;
    expect(last).toEqual({ kind: 'problem', message: expect.stringContaining('Nothing was changed') });
  });

  test('stops when whoever asked has gone, and says no more', async () => {
    const stopping = new AbortController();
    const response = await ask({ signal: stopping.signal });
    const reader = response.body?.getReader();
    await reader?.read();
    stopping.abort();
    const rest: Uint8Array[] = [];
    for (let read = await reader?.read(); read && !read.done; read = await reader?.read())
      rest.push(read.value);
    expect(new TextDecoder().decode(Buffer.concat(rest))).not.toContain('"kind":"preview"');
  });
});
