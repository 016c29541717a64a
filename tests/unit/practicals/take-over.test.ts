import { describe, expect, it } from 'vitest';
import { draftOf } from '@/lib/practicals/draft-of';
import { ownDifferences, takeOver } from '@/lib/practicals/take-over';
import { comparedStarter } from '@/tests/support/compared';

const original = { ...comparedStarter('version 1'), number: 1 };
const newer = comparedStarter('version 2', (draft) => {
  draft.title = 'Desk caddy, 2026';
  draft.all.missing = '5';
});

const mine = () => ({ ...draftOf(original.task, original.form), title: 'Caddy for period 5' });

describe('taking a version over', () => {
  it('takes everything of it but the title', () => {
    const draft = mine();
    const before = structuredClone(draft);
    expect(takeOver(newer, draft)).toEqual({
      ...draftOf(newer.task, newer.form),
      title: 'Caddy for period 5',
    });
    expect(draft).toEqual(before);
  });
});

describe('own differences', () => {
  it('are none for a draft that says the same, whatever its title and however it is typed', () => {
    const draft = { ...mine(), title: '' };
    for (const line of draft.lines) line.thickness = '0.5';
    expect(ownDifferences(draft, original)).toEqual([]);
  });

  it('tell in words what was made otherwise', () => {
    const draft = mine();
    draft.redo.capPercent = '100';
    draft.lines.pop();
    const words = JSON.stringify(ownDifferences(draft, original));
    expect(words).toContain('divider');
    expect(words).toMatch(/redo/i);
  });

  it('call the draft by that name where its prices differ', () => {
    const draft = mine();
    draft.all.sizes.length.under.beyond = '5';
    draft.all.sizes.length.mirrored = false;
    expect(ownDifferences(draft, original)[0]?.[0]).toMatch(
      /^Your draft takes 2 points more than version 1 for/,
    );
  });

  it('of a draft that cannot be read are told by its fields, at most twelve of them', () => {
    const draft = mine();
    draft.kerf = '1/';
    const [was] = [mine().kerf];
    expect(ownDifferences(draft, original)).toEqual([[`kerf: now 1/, was ${was}.`]]);
    for (const line of draft.lines) Object.assign(line, { width: '', length: '', note: 'x', label: 'y' });
    const many = ownDifferences(draft, original);
    expect(many).toHaveLength(13);
    expect(many.at(-1)).toEqual(['And 5 more fields.']);
  });
});
