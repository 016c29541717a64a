import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { COMMON_PASSWORDS } from '@/lib/auth/common-passwords';
import { PASSWORD_MAX, passwordProblem } from '@/lib/auth/password-rules';

const owner = {
  givenName: 'Rut',
  familyName: 'Lindqvist',
  schoolName: 'Cedar Fork High School',
  email: 'r.lindqvist@cedarfork.example',
  localId: null,
};

const check = (password: string) => passwordProblem(password, owner);

it.each([
  'plane with the grain',
  'seven dull chisels!',
  'ÄPFEL UND BIRNEN IM KORB',
  '739105826451937',
  'lindqvist rides otters home',
  'my school has a leaky roof',
  '木を切る前に二度測ること、いつも',
  'a'.concat(' quiet morning at the lathe'),
])('takes %j', (password) => {
  expect(check(password)).toBeNull();
});

describe('length', () => {
  it('wants 15 code points (SP 800-63B-4 for a password alone)', () => {
    expect(check('dull chisels 7')).toMatch(/15 characters or more; this has 14/);
    expect(check('dull chisels 77')).toBeNull();
  });

  it('counts code points, not the units of the encoding', () => {
    expect(check('🪵🪚🔨🪛📐📏🧰')).toMatch(/this has 7/);
    expect(check('🪵🪚🔨🪛📐📏🧰🌲🌳🌴🎋🌿🍂🍁🌾')).toBeNull();
  });

  it('takes 256 and refuses 257', () => {
    const text = Array.from({ length: 40 }, (_, index) => `plank ${index} `).join('');
    expect(check(text.slice(0, PASSWORD_MAX))).toBeNull();
    expect(check(text.slice(0, PASSWORD_MAX + 1))).toMatch(/at most 256/);
  });

  it('asks for no kinds of characters: any four different words will do', () => {
    const words = fc.uniqueArray(
      fc.constantFrom('quarry', 'biplane', 'walnut', 'teapot', 'lagoon', 'otter', 'gravel'),
      {
        minLength: 4,
        maxLength: 4,
      },
    );
    fc.assert(fc.property(words, (four) => check(four.join(' ')) === null));
  });
});

describe('refuses', () => {
  it.each([
    ['r.lindqvist@cedarfork.example', /name, an address/],
    ['R.Lindqvist@CedarFork.Example', /name, an address/],
    ['rut lindqvist 2026', /name, an address/],
    ['LindqvistLindqvist', /repeats/],
    ['cedar fork high school', /name, an address/],
    ['CedarForkHigh2026', /name, an address/],
    ['trymark trymark 1', /name, an address/],
    ['passwordschool99', /name, an address/],
    ['aaaaaaaaaaaaaaaa', /repeats/],
    ['abababababababab', /repeats/],
    ['saw saw saw saw saw', /repeats/],
    ['Correct Horse Battery Staple', /first passwords/],
    ['123456789012345', /repeats|first passwords/],
    ['qwertyuiop asdfghjkl', /first passwords/],
    ['Measure twice, cut once', /first passwords/],
    ['zyxwvutsrqponmlk', /first passwords/],
  ])('%j', (password, reason) => {
    expect(check(password)).toMatch(reason);
  });

  it('every password of its own list of common ones', () => {
    expect(COMMON_PASSWORDS.size).toBeGreaterThan(150);
    const passed = [...COMMON_PASSWORDS].filter((password) => check(password) === null);
    expect(passed).toEqual([]);
  });

  it('lists only what could pass for long enough, written as it is compared', () => {
    const odd = [...COMMON_PASSWORDS].filter((password) => !/^[a-z0-9]{15,}$/.test(password));
    expect(odd).toEqual([]);
  });
});
