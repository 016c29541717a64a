'use server';

import { revalidatePath } from 'next/cache';
import { redirect } from 'next/navigation';
import { currentActor } from '@/lib/auth/session';
import { importPractical } from '@/lib/data/practicals/import-practical';
import { decodePracticalFile } from '@/lib/practicals/decode-practical-file';
import { type FileProblem, readPracticalFile } from '@/lib/practicals/read-practical-file';

export interface ShownProblem extends FileProblem {
  /** The line as it stands, or the part of it around the place. */
  excerpt: string;
}

/** What an import that made nothing says, with the text that was read, so that it can be put right on the spot. */
export type ImportReply =
  | { kind: 'refused'; message: string; at: 'file' | 'text' | null; text: string }
  | { kind: 'problems'; problems: ShownProblem[]; fileName: string | null; text: string }
  | null;

export async function importPracticalAction(_: ImportReply, data: FormData): Promise<ImportReply> {
  const file = data.get('file');
  const typed = data.get('text');
  const pasted = typeof typed === 'string' ? typed : '';
  const isFile = file instanceof File && file.size > 0;
  const refused = (message: string, at: 'file' | 'text' | null): ImportReply => ({
    ...{ kind: 'refused', message, at },
    text: pasted,
  });
  if (!isFile && pasted.trim() === '') return refused('Choose a file, or paste what it says.', 'file');
  const decoded = isFile ? decodePracticalFile(await readBytes(file)) : { ok: true as const, text: pasted };
  if (!decoded.ok) return refused(decoded.reason, 'file');
  const { text } = decoded;
  const result = await importPractical(await currentActor(), { text });
  if (result.ok) {
    revalidatePath('/practicals', 'layout');
    redirect(`/practicals/${result.value.practicalId}?step=task`);
  }
  const read = result.problem.code === 'invalid' ? readPracticalFile(text) : null;
  if (!read || read.ok) return refused(result.problem.message, isFile ? 'file' : 'text');
  return {
    kind: 'problems',
    problems: withExcerpts(read.problems, text),
    fileName: isFile ? file.name : null,
    text,
  };
}

async function readBytes(file: File): Promise<Uint8Array> {
  return new Uint8Array(await file.arrayBuffer());
}

const EXCERPT = 72;

function withExcerpts(problems: readonly FileProblem[], text: string): ShownProblem[] {
  const lines = text.replace(/^\uFEFF/, '').split(/\r\n|\n|\r/);
  return problems.map((problem) => {
    const line = lines[problem.line - 1] ?? '';
    const from = Math.max(0, Math.min(problem.column - 1 - EXCERPT / 2, line.length - EXCERPT));
    return { ...problem, excerpt: line.slice(from, from + EXCERPT).trim() };
  });
}
