import { randomInt } from 'node:crypto';
import { PASSPHRASE_WORDS } from './passphrase-words';

/** Words in a passphrase that the product makes: 4 different ones of 1168, drawn evenly, are worth 40.7 bits. */
export const WORD_COUNT = 4;

/** A new passphrase, such as `maple otter quarter lagoon`. */
export function makePassphrase(): string {
  const words = new Set<string>();
  while (words.size < WORD_COUNT) words.add(drawWord());
  return [...words].join(' ');
}

/** The passphrase as it was made, however a phone or a hurried hand wrote it: `Maple-Otter  quarter lagoon `. */
export function tidyPassphrase(typed: string): string {
  return typed
    .normalize('NFKC')
    .toLowerCase()
    .replaceAll(/[\s._-]+/gu, ' ')
    .trim();
}

function drawWord(): string {
  const word = PASSPHRASE_WORDS[randomInt(PASSPHRASE_WORDS.length)];
  if (word === undefined) throw new Error('The list of words is empty.');
  return word;
}
