/**
 * The lines of a stream of bytes, as soon as each has come whole, in UTF-8 and without the newline; empty ones are
 * left out. What stands after the last newline is a line too. Throws what the stream throws; stopping early lets the
 * stream go.
 *
 * @example for await (const line of readLines(new Response('one\ntwo').body)) … // 'one', then 'two'
 */
export async function* readLines(bytes: ReadableStream<Uint8Array> | null): AsyncGenerator<string> {
  if (!bytes) return;
  const reader = bytes.getReader();
  const decoder = new TextDecoder();
  let rest = '';
  try {
    for (;;) {
      const { done, value } = await reader.read();
      const lines = (rest + decoder.decode(value, { stream: !done })).split('\n');
      rest = done ? '' : (lines.pop() ?? '');
      yield* lines.filter((line) => line.trim() !== '');
      if (done) return;
    }
  } finally {
    await reader.cancel().catch(() => undefined);
  }
}
