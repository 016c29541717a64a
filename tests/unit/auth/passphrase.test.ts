import { describe, expect, it } from 'vitest';
import { makePassphrase, tidyPassphrase, WORD_COUNT } from '@/lib/auth/passphrase';
import { PASSPHRASE_WORDS } from '@/lib/auth/passphrase-words';
import { passwordProblem } from '@/lib/auth/password-rules';

const owner = {
  givenName: 'Wayra',
  familyName: 'Quispe',
  schoolName: 'Cedar Fork High School',
  localId: '00426',
};

describe('the words', () => {
  it('are enough for 40 bits in a passphrase', () => {
    expect(PASSPHRASE_WORDS.length).toBe(1168);
    const choices = Array.from({ length: WORD_COUNT }, (_, drawn) => PASSPHRASE_WORDS.length - drawn);
    expect(choices.reduce((bits, count) => bits + Math.log2(count), 0)).toBeGreaterThan(40.7);
  });

  it('are plain lower-case words of three to eight letters, each once', () => {
    expect(PASSPHRASE_WORDS.filter((word) => !/^[a-z]{3,8}$/.test(word))).toEqual([]);
    expect(new Set(PASSPHRASE_WORDS).size).toBe(PASSPHRASE_WORDS.length);
  });
});

describe('a passphrase', () => {
  it('is four different words of the list and passes as a password', () => {
    for (let made = 0; made < 200; made += 1) {
      const words = makePassphrase().split(' ');
      expect(words).toHaveLength(4);
      expect(new Set(words).size).toBe(4);
      expect(words.every((word) => PASSPHRASE_WORDS.includes(word))).toBe(true);
      expect(words.join(' ').length).toBeGreaterThanOrEqual(15);
      expect(passwordProblem(words.join(' '), owner)).toBeNull();
    }
  });

  it('draws from the whole list, about evenly', () => {
    const drawn = new Set(Array.from({ length: 5_000 }, makePassphrase).join(' ').split(' '));
    expect(drawn.size).toBe(PASSPHRASE_WORDS.length);
  });

  it.each(['Maple-Otter  quarter_lagoon ', 'MAPLE OTTER QUARTER LAGOON', ' maple.otter quarter\tlagoon'])(
    'is known again when written as %j',
    (typed) => {
      expect(tidyPassphrase(typed)).toBe('maple otter quarter lagoon');
    },
  );
});
