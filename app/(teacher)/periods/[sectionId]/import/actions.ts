'use server';

import { revalidatePath } from 'next/cache';
import { currentActor } from '@/lib/auth/session';
import { decodeText, MAX_FILE_BYTES, tooLong } from '@/lib/csv/decode-text';
import type { RosterText } from '@/lib/csv/read-roster';
import { type ImportedView, importRoster } from '@/lib/data/sections/import-roster';
import { previewRoster, type RosterPreviewView } from '@/lib/data/sections/preview-roster';
import type { FieldErrors, Problem } from '@/lib/result';

/** A text as it was looked at, with what an import of it would do. */
export interface LookedAt {
  roster: RosterText;
  /** Where the text came from, if from a file, and how its letters were read. */
  fileName: string | null;
  note: string | null;
  preview: RosterPreviewView;
}

export type Reply<T> = { ok: true; value: T } | { ok: false; fields: FieldErrors };

/** Looks at what was pasted, or at a text whose columns were chosen. */
export async function lookAtTextAction(sectionId: string, roster: RosterText): Promise<Reply<LookedAt>> {
  return look(sectionId, { roster, fileName: null, note: null });
}

/** Looks at a file: its bytes come as they are, so that their encoding is judged here. */
export async function lookAtFileAction(sectionId: string, data: FormData): Promise<Reply<LookedAt>> {
  const file = data.get('file');
  if (!(file instanceof File)) return refuseFile('Choose a file, or paste the names.');
  if (file.size > MAX_FILE_BYTES) return refuseFile(tooLong(file.size));
  const decoded = decodeText(new Uint8Array(await file.arrayBuffer()));
  if (!decoded.ok) return refuseFile(decoded.reason);
  const roster: RosterText = { kind: 'csv', text: decoded.text };
  const reply = await look(sectionId, { roster, fileName: file.name, note: decoded.note });
  if (reply.ok) return reply;
  const { 'roster.text': atText, ...fields } = reply.fields;
  return { ok: false, fields: atText ? { ...fields, file: atText } : fields };
}

export async function importRosterAction(input: unknown): Promise<Reply<ImportedView>> {
  const result = await importRoster(await currentActor(), input);
  if (!result.ok) return { ok: false, fields: fieldsOf(result.problem) };
  revalidatePath('/periods', 'layout');
  return { ok: true, value: result.value };
}

async function look(sectionId: string, source: Omit<LookedAt, 'preview'>): Promise<Reply<LookedAt>> {
  const result = await previewRoster(await currentActor(), { sectionId, roster: source.roster });
  return result.ok
    ? { ok: true, value: { ...source, preview: result.value } }
    : { ok: false, fields: fieldsOf(result.problem) };
}

const PLACES = /^(roster\.text|roster\.layout|choices\.\d+)/;

/** Messages by the place on the screen that shows them; what has none stands under ''. */
function fieldsOf({ code, message, fields = {} }: Problem): FieldErrors {
  if (code === 'stale') return { stale: [message] };
  if (code !== 'invalid') return { '': [message] };
  const placed: FieldErrors = {};
  for (const [path, messages] of Object.entries(fields)) {
    const place = PLACES.exec(path)?.[0] ?? '';
    placed[place] = [...(placed[place] ?? []), ...messages];
  }
  return placed;
}

function refuseFile(reason: string): { ok: false; fields: FieldErrors } {
  return { ok: false, fields: { file: [reason] } };
}
