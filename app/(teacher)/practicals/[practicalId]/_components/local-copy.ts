import { z } from 'zod';
import { practicalDraftSchema } from '@/lib/practicals/draft';
import type { KeptDraft, LocalCopy, LocalStore } from './draft-keeper';

const copySchema = z.strictObject({
  revision: z.int().min(1),
  content: practicalDraftSchema,
  sent: practicalDraftSchema.nullable(),
});

const keptSchema = z.strictObject({
  revision: z.int().min(1),
  content: practicalDraftSchema,
  at: z.string(),
});

const keyOf = (practicalId: string) => `trymark.draft.${practicalId}`;

/** What was typed on this device and not confirmed; none when the browser keeps nothing or it is damaged. */
export function readLocalCopy(practicalId: string): LocalCopy | null {
  try {
    const text = localStorage.getItem(keyOf(practicalId));
    const copy = text === null ? null : copySchema.safeParse(JSON.parse(text));
    return copy?.success ? copy.data : null;
  } catch {
    return null;
  }
}

/** What this tab last knew to be kept on the server. */
export function readKeptHere(practicalId: string): KeptDraft | null {
  try {
    const text = sessionStorage.getItem(keyOf(practicalId));
    const kept = text === null ? null : keptSchema.safeParse(JSON.parse(text));
    return kept?.success ? kept.data : null;
  } catch {
    return null;
  }
}

/** The device's own copy. A browser that refuses to keep it only loses this second safety. */
export function localStoreOf(practicalId: string): LocalStore {
  const key = keyOf(practicalId);
  const quietly = (work: () => void) => {
    try {
      work();
    } catch {}
  };
  const clear = () => quietly(() => localStorage.removeItem(key));
  return {
    put: (copy) => quietly(() => localStorage.setItem(key, JSON.stringify(copy))),
    kept(draft) {
      quietly(() => sessionStorage.setItem(key, JSON.stringify(draft)));
      clear();
    },
    clear,
  };
}
