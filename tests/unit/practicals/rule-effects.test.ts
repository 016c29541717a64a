import { describe, expect, it } from 'vitest';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import type { PracticalDraft } from '@/lib/practicals/draft';
import { checksEffect, type RuleEffects, ruleEffects } from '@/lib/practicals/rule-effects';
import { comparedStarter } from '@/tests/support/compared';

function say(rule: keyof RuleEffects, change: (draft: PracticalDraft) => void = () => {}): string {
  const { rubric, form } = comparedStarter('caddy', change);
  return ruleEffects(rubric, form)
    [rule].map((part) => (typeof part === 'string' ? part : lengthAsTyped(part.ticks, 'in')))
    .join('');
}

describe('what a rule of the whole does, on the desk caddy', () => {
  it('is told of the scale in both scales', () => {
    expect(say('scale')).toBe('The pieces are worth 63 together. 1 of 63 is 1.59 of 100.');
    expect(
      say('scale', (draft) => Object.assign(draft.total, { basis: 'start', start: '100', outOf: '' })),
    ).toBe('Losses come off 100; the pieces together are worth 63. A point lost is a point of the score.');
  });

  it('is told of rounding, floor and ceiling', () => {
    // The typical set: 7 of 21 sizes a step off, 1 point each: 56 of 63 is 88.888….
    expect(say('rounding')).toBe('The typical set keeps 88.89 and scores 89.');
    expect(say('rounding', (draft) => Object.assign(draft.total, { roundTo: '0.1' }))).toBe(
      'The typical set keeps 88.89 and scores 88.9.',
    );
    expect(say('floor')).toBe('A set with nothing in it scores 0.');
    expect(say('floor', (draft) => Object.assign(draft.total, { floor: '50' }))).toBe(
      'A set with nothing in it scores 50.',
    );
    expect(say('ceiling')).toBe('A perfect set with a bonus of 2 scores 102 of 100.');
    expect(say('ceiling', (draft) => Object.assign(draft.total, { ceiling: '100' }))).toBe(
      'A perfect set with a bonus of 2 scores 100 of 100.',
    );
  });

  it('is told of pieces read the other way round, and of sets', () => {
    expect(say('swap')).toBe('base read 3 1/2 by 1/2 instead of 1/2 by 3 1/2 loses nothing.');
    expect(say('swap', (draft) => Object.assign(draft.all, { swap: false }))).toBe(
      'base read 3 1/2 by 1/2 instead of 1/2 by 3 1/2 loses 9.',
    );
    expect(say('set')).toBe('One end of 2 1/16 short: the line loses 1.');
    expect(say('set', (draft) => Object.assign(draft.all, { set: 'worst' }))).toBe(
      'One end of 2 1/16 short: the line loses 2.',
    );
  });

  it('is told of margin, gross limit and rounding of deviations', () => {
    expect(say('margin')).toBe('base, length: 1/32 and 0.002 over loses nothing, a hair more 1.');
    expect(say('margin', (draft) => Object.assign(draft.reading, { margin: '0' }))).toBe(
      'base, length: 1/32 over loses nothing, a hair more 1.',
    );
    expect(say('gross')).toBe('base, length: 1/4 and 0.002 over loses 3, a hair more 9, all it is worth.');
    expect(say('gross', (draft) => Object.assign(draft.reading, { grossLimit: '' }))).toBe(
      'No size is too far off to be that part.',
    );
    expect(say('readTo')).toBe('Every deviation is scored as it was read.');
    expect(say('readTo', (draft) => Object.assign(draft.reading, { readTo: '1/64' }))).toMatch(
      /is scored as 1\/64 over\.$/,
    );
  });

  it('is told of redo, lateness and prediction', () => {
    expect(say('redo')).toBe('First 62, then 97: 90 counts.');
    expect(say('redo', (draft) => Object.assign(draft.redo, { kind: 'average' }))).toBe(
      'First 62, then 97: 80 counts.',
    );
    expect(say('late')).toBe('The typical set keeps its 89, however late it comes.');
    expect(say('late', (draft) => Object.assign(draft.late, { perDay: '5', max: '20' }))).toBe(
      'The typical set scores 89, and 76 when it comes 3 days late.',
    );
    expect(say('prediction')).toBe(
      'Of 21 sizes, 19 within 1/32 of yours, 11 of them read by number, and of 6 off-band sizes 4 caught: 2 more.',
    );
    expect(say('work')).toBe('Failing it loses 1 of 63, 1.59 of 100.');
    const { rubric } = comparedStarter('caddy');
    expect(checksEffect(rubric, 'end')).toBe(
      'end 1 on target that fails both checks loses 2 of 63, 3.17 of 100.',
    );
    expect(checksEffect(rubric, 'none')).toBe('');
    expect(say('close')).toBe('Else, predicted 85 and measured 82: 1 more; a point further off: nothing.');
  });
});
