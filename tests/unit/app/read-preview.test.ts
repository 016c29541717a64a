import { afterEach, describe, expect, it, vi } from 'vitest';
import {
  PreviewFailure,
  readPreview,
} from '@/app/(teacher)/sittings/[sittingId]/move/_components/read-preview';
import type { MovePreview, PreviewLine } from '@/lib/contracts/moves';

const PREVIEW: MovePreview = {
  sittingId: 's',
  from: { versionId: 'a', number: 1, total: 10_000 },
  to: { versionId: 'b', number: 2, total: 10_000 },
  students: [],
  gain: 0,
  same: 0,
  lose: 0,
  meanChange: null,
  notAsked: [],
  seen: 'seen',
};

function serve(lines: readonly (PreviewLine | string)[], init?: ResponseInit): void {
  const text = lines.map((line) => (typeof line === 'string' ? line : JSON.stringify(line))).join('\n');
  vi.stubGlobal('fetch', async () => new Response(text, init));
}

const read = (onProgress = (_done: number, _of: number) => {}) =>
  readPreview('/api', new AbortController().signal, onProgress);

afterEach(() => vi.unstubAllGlobals());

describe('a preview that comes line by line', () => {
  it('tells its progress and ends with the preview', async () => {
    serve([
      { kind: 'progress', done: 0, of: 2 },
      { kind: 'progress', done: 2, of: 2 },
      { kind: 'preview', preview: PREVIEW },
    ]);
    const seen: [number, number][] = [];
    expect(await read((done, of) => seen.push([done, of]))).toEqual(PREVIEW);
    expect(seen).toEqual([
      [0, 2],
      [2, 2],
    ]);
  });

  it('says so when it breaks off, cannot be read, or was refused on the way', async () => {
    serve([{ kind: 'progress', done: 1, of: 2 }]);
    await expect(read()).rejects.toThrow('broke off');
    serve(['{"kind":"progress","do']);
    await expect(read()).rejects.toThrow('not a preview that this page can read');
    serve([{ kind: 'problem', message: 'The database does not answer.' }]);
    await expect(read()).rejects.toThrow('The database does not answer.');
  });

  it('knows that somebody is signed out, and gives the server’s own words', async () => {
    serve([JSON.stringify({ problem: { code: 'unauthenticated', message: 'Sign in first.' } })], {
      status: 401,
    });
    await expect(read()).rejects.toEqual(new PreviewFailure('Sign in first.', true));
    serve(['<html>'], { status: 502 });
    await expect(read()).rejects.toThrow('The server does not answer.');
  });
});
