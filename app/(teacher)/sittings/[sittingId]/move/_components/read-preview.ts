import { z } from 'zod';
import { previewLineSchema } from '@/lib/contracts/move-preview';
import type { MovePreview } from '@/lib/contracts/moves';
import { readLines } from '@/lib/practicals/read-lines';

/** Why there is no preview, in words for the page. */
export class PreviewFailure extends Error {
  constructor(
    message: string,
    readonly signedOut = false,
  ) {
    super(message);
  }
}

const refusalSchema = z.object({ problem: z.object({ message: z.string() }) });

/** Reads a preview's stream to its end, telling how far it has come. Throws a PreviewFailure, or what the network throws. */
export async function readPreview(
  url: string,
  signal: AbortSignal,
  onProgress: (done: number, of: number) => void,
): Promise<MovePreview> {
  const response = await fetch(url, { signal, cache: 'no-store' });
  if (!response.ok) throw await refusalOf(response);
  for await (const text of readLines(response.body)) {
    const line = lineOf(text);
    if (line.kind === 'progress') onProgress(line.done, line.of);
    else if (line.kind === 'preview') return line.preview;
    else throw new PreviewFailure(line.message);
  }
  throw new PreviewFailure('The preview broke off before it was whole.');
}

function lineOf(text: string) {
  try {
    return previewLineSchema.parse(JSON.parse(text));
  } catch {
    throw new PreviewFailure('What came is not a preview that this page can read. Load the page again.');
  }
}

async function refusalOf(response: Response): Promise<PreviewFailure> {
  const refusal = refusalSchema.safeParse(await response.json().catch(() => null));
  const message = refusal.success ? refusal.data.problem.message : 'The server does not answer.';
  return new PreviewFailure(message, response.status === 401);
}
