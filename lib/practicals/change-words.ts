import type { ComparedRow, Phrase } from './compare-types';
import { valueWords } from './compare-words';

/** "Kerf: now 1/8, was 3/32." */
export function nowWas(label: Phrase | string, now: Phrase | string, was: Phrase | string): Phrase {
  const parts = [...capital(asPhrase(label)), ': now ', ...asPhrase(now), ', was ', ...asPhrase(was), '.'];
  return parts.reduce<Phrase>(append, []);
}

/** The rows of two that differ, told as what is now and what was. */
export function rowChanges(rows: readonly ComparedRow[]): Phrase[] {
  return rows
    .filter(({ differs }) => differs)
    .map(({ label, values: [was, now] }) =>
      nowWas(label, now ? valueWords(now) : 'none', was ? valueWords(was) : 'none'),
    );
}

export function quoted(text: string): string {
  return text === '' ? 'none' : `“${text}”`;
}

export function capital(phrase: Phrase): Phrase {
  const [first, ...rest] = phrase;
  if (typeof first !== 'string') return phrase;
  return [first.charAt(0).toUpperCase() + first.slice(1), ...rest];
}

/** Words that follow words go on with them. */
function append(phrase: Phrase, part: Phrase[number]): Phrase {
  const last = phrase.at(-1);
  if (typeof last !== 'string' || typeof part !== 'string') return [...phrase, part];
  return [...phrase.slice(0, -1), last + part];
}

function asPhrase(words: Phrase | string): Phrase {
  return typeof words === 'string' ? [words] : words;
}
