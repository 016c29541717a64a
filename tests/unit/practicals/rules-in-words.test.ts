import { describe, expect, it } from 'vitest';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import { decodePracticalFile } from '@/lib/practicals/decode-practical-file';
import { rulesInWords } from '@/lib/practicals/rules-in-words';
import { comparedStarter } from '@/tests/support/compared';

const said = (change: Parameters<typeof comparedStarter>[1] = () => {}) => {
  const { rubric, form } = comparedStarter('version 1', change);
  const rules = rulesInWords(rubric, form).map(({ label, phrase }) => {
    const words = phrase.map((part) => (typeof part === 'string' ? part : lengthAsTyped(part.ticks, 'in')));
    return [label, words.join('')] as const;
  });
  return Object.fromEntries(rules);
};

describe('the rules of a version in words', () => {
  it('say the product’s defaults', () => {
    expect(said()).toEqual({
      total: 'The pieces are worth 63 points together. That is scaled to 100: 1 of 63 is 1.59 of 100.',
      rounding: 'The score is rounded once, to 1 point, half up. A bonus can lift it to 102% of the total.',
      reading: 'Each price begins 0.002 past the edge of its band, for the instrument.',
      'gross limit': 'A piece with a size more than 1/4 off is not that part: it loses its worth.',
      'check: square': 'On every piece: good 0, not good 1; taken as good.',
      'check: surface': 'On every piece: good 0, not good 1; taken as good.',
      'check: name and period on pieces':
        'Once, for the whole work: good 0, not good 1; nothing taken for granted.',
      'thickness and width': 'Thickness and width may be read either way round; the cheaper way counts.',
      'pieces of a line': 'Each piece is priced by itself.',
      'late work': 'The days are recorded and cost nothing.',
      redo: 'The higher score counts; a redo counts up to 90% of the total.',
      prediction:
        '2 points if 90% of the sizes agree within 1/32, 2/3 of the off-band ones were caught and 50% were read by number. Else 1 point if the two totals are within 3.',
    });
  });

  it('say what was set otherwise', () => {
    const rules = said((draft) => {
      draft.total = {
        ...draft.total,
        basis: 'start',
        start: '100',
        roundTo: '0.5',
        floor: '20',
        ceiling: '100',
      };
      draft.reading = { margin: '0', readTo: '1/64', grossLimit: '' };
      draft.late = { perDay: '5', max: '20' };
      draft.redo = { kind: 'average', capPercent: '90', roundTo: '1' };
      draft.prediction = { ...draft.prediction, full: '0', close: '0' };
      Object.assign(draft.lines[1] ?? {}, { swap: false, set: 'worst', checks: [] });
    });
    expect(rules).toMatchObject({
      total: 'The score starts from 100 points, and losses come off.',
      rounding:
        'The score is rounded once, to 0.5 points, half up. Losses never take it below 20%. No bonus lifts it above the total.',
      reading: 'Each price begins at the edge of its band. A deviation is first rounded to the nearest 1/64.',
      'gross limit': 'None: however far off, a size costs no more than its price.',
      'check: square': 'On base, side and divider: good 0, not good 1; taken as good.',
      'thickness and width': 'On base, side and divider, thickness and width may be read either way round.',
      'pieces of a line':
        'All present pieces of end lose what the worst of them loses; others are priced by themselves.',
      'late work': 'Each day late takes 5% off the score, 20% at most.',
      redo: 'The mean of all attempts counts, rounded to 1 point.',
      prediction: 'It brings no points.',
    });
  });
});

describe('the bytes of a practical file', () => {
  const bytes = (text: string) => new TextEncoder().encode(text);

  it('are UTF-8, with or without a byte order mark', () => {
    expect(decodePracticalFile(bytes('{}'))).toEqual({ ok: true, text: '{}' });
    expect(decodePracticalFile(new Uint8Array([0xef, 0xbb, 0xbf, 0x7b, 0x7d]))).toEqual({
      ok: true,
      text: '{}',
    });
  });

  it('are refused past 1 MB, and when they are no text', () => {
    expect(decodePracticalFile(bytes('x'.repeat(1_200_000)))).toEqual({
      ok: false,
      reason: 'This file has 1.2 MB. A practical file has at most 1 MB.',
    });
    expect(decodePracticalFile(new Uint8Array([0xff, 0xfe, 0x7b, 0x00]))).toMatchObject({ ok: false });
  });
});
