import { z } from 'zod';
import { practicalDraftSchema } from '@/lib/practicals/draft';
import type { LocalCopy, LocalStore } from './draft-keeper';

const copySchema = z.strictObject({
  revision: z.int().min(1),
  content: practicalDraftSchema,
  sent: practicalDraftSchema.nullable(),
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

/** The device's own copy. A browser that refuses to keep it only loses this second safety. */
export function localStoreOf(practicalId: string): LocalStore {
  const quietly = (work: () => void) => {
    try {
      work();
    } catch {}
  };
  return {
    put: (copy) => quietly(() => localStorage.setItem(keyOf(practicalId), JSON.stringify(copy))),
    clear: () => quietly(() => localStorage.removeItem(keyOf(practicalId))),
  };
}
