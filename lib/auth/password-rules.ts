import { COMMON_PASSWORDS, WORN_WORDS } from './common-passwords';

export const PASSWORD_MIN = 15;
export const PASSWORD_MAX = 256;

const KEY_RUNS = ['abcdefghijklmnopqrstuvwxyz', '01234567890', 'qwertyuiop', 'asdfghjkl', 'zxcvbnm'];
const RUN_MIN = 4;
const DISTINCT_MIN = 5;

/** What a password must not be made of: names and addresses that others know. */
export interface PasswordOwner {
  givenName: string;
  familyName: string;
  schoolName: string;
  email?: string | null;
  localId?: string | null;
}

/**
 * Says what is wrong with a new password, or null when it can be used. Length is counted in code points after NFKC;
 * no kinds of characters are asked for.
 */
export function passwordProblem(password: string, owner: PasswordOwner): string | null {
  const text = password.normalize('NFKC');
  const length = [...text].length;
  if (length < PASSWORD_MIN) {
    return `Use ${PASSWORD_MIN} characters or more; this has ${length}. Spaces count: a short sentence works well.`;
  }
  if (length > PASSWORD_MAX) return `Use at most ${PASSWORD_MAX} characters; this has ${length}.`;
  const plain = squeeze(text);
  if (new Set(text.toLowerCase()).size < DISTINCT_MIN || repeats(plain)) {
    return 'This repeats the same few characters. Use words that do not repeat.';
  }
  if (COMMON_PASSWORDS.has(plain) || isRunOfKeys(plain)) {
    return 'This is one of the first passwords that anybody would try. Use another.';
  }
  if (isMostlyKnown(plain, owner)) {
    return 'Half of this or more is a name, an address or a word that everybody uses. Add words of your own.';
  }
  return null;
}

/** Letters and digits alone, in lower case and without accents. */
function squeeze(text: string): string {
  return text
    .normalize('NFKD')
    .toLowerCase()
    .replaceAll(/[^\p{L}\p{N}]/gu, '');
}

/** Whether the text is one shorter piece, said again and again to the end. */
function repeats(plain: string): boolean {
  return plain.length > 0 && (plain + plain).indexOf(plain, 1) < plain.length;
}

function isRunOfKeys(plain: string): boolean {
  return plain.length > RUN_MIN && withoutRuns(plain).length < RUN_MIN;
}

function withoutRuns(plain: string): string {
  let rest = plain;
  for (const run of [...KEY_RUNS, ...KEY_RUNS.map((keys) => [...keys].reverse().join(''))]) {
    for (let size = run.length; size >= RUN_MIN; size -= 1) {
      for (let at = 0; at + size <= run.length; at += 1) {
        rest = rest.replaceAll(run.slice(at, at + size), '');
      }
    }
  }
  return rest;
}

/** Whether names, addresses, worn words and rows of keys make up half of it or more. */
function isMostlyKnown(plain: string, owner: PasswordOwner): boolean {
  const known = [owner.givenName, owner.familyName, owner.schoolName, owner.email ?? '', owner.localId ?? '']
    .flatMap((text) => [text, ...text.split(/[^\p{L}\p{N}]+/u)])
    .map(squeeze)
    .filter((word) => word.length >= 3)
    .concat(WORN_WORDS)
    .sort((a, b) => b.length - a.length);
  const rest = known.reduce((text, word) => text.replaceAll(word, ' '), plain);
  return rest !== plain && squeeze(withoutRuns(rest)).length * 2 <= plain.length;
}
