import { CSV_TYPE } from '@/lib/data/gradebook/csv-type';
import type { Result } from '@/lib/result';
import { answerProblem } from '@/lib/transport/route';

type FileView = { fileName: string } & ({ text: string } | { bytes: Uint8Array });

/** A file of a verb as a download under its own name, or the problem. */
export function answerFile(result: Result<FileView>): Response {
  if (!result.ok) return answerProblem(result.problem);
  const file = result.value;
  return new Response('text' in file ? file.text : new Uint8Array(file.bytes), {
    headers: {
      'content-type': CSV_TYPE,
      'content-disposition': `attachment; filename="${file.fileName}"`,
      'cache-control': 'private, no-store',
      'x-content-type-options': 'nosniff',
    },
  });
}
