import { describe, expect, it } from 'vitest';
import { readLines } from '@/lib/practicals/read-lines';

function streamOf(chunks: readonly Uint8Array[], onCancel = () => {}): ReadableStream<Uint8Array> {
  const waiting = [...chunks];
  return new ReadableStream({
    pull(controller) {
      const next = waiting.shift();
      if (next) controller.enqueue(next);
      else controller.close();
    },
    cancel: onCancel,
  });
}

async function linesOf(chunks: readonly Uint8Array[]): Promise<string[]> {
  const lines: string[] = [];
  for await (const line of readLines(streamOf(chunks))) lines.push(line);
  return lines;
}

const bytes = (text: string) => new TextEncoder().encode(text);

describe('lines of a stream', () => {
  it('come whole, also the last one without its newline, and empty ones not at all', async () => {
    expect(await linesOf([bytes('one\ntwo\n\nthree')])).toEqual(['one', 'two', 'three']);
    expect(await linesOf([bytes('one\n')])).toEqual(['one']);
    expect(await linesOf([])).toEqual([]);
  });

  it('are the same wherever the stream is cut, in the middle of a letter too', async () => {
    const whole = bytes('Jurić − 3\nBergström + 2\n');
    for (let cut = 1; cut < whole.length; cut++) {
      expect(await linesOf([whole.slice(0, cut), whole.slice(cut)])).toEqual(['Jurić − 3', 'Bergström + 2']);
    }
  });

  it('let the stream go when nobody wants more', async () => {
    let cancelled = false;
    const stream = streamOf([bytes('one\ntwo\n'), bytes('three\n')], () => {
      cancelled = true;
    });
    for await (const line of readLines(stream)) {
      expect(line).toBe('one');
      break;
    }
    expect(cancelled).toBe(true);
  });

  it('are none where there is no body', async () => {
    const lines: string[] = [];
    for await (const line of readLines(null)) lines.push(line);
    expect(lines).toEqual([]);
  });
});
