import { describe, expect, test } from 'vitest';
import { sayAction, sayDetails } from '@/app/(admin)/school/log/_components/action-words';

const ID = '0b7f6a52-3f38-4f3e-9a55-2f0f6a1f9f10';

describe('the access log says what was done', () => {
  test.each([
    [
      { moveId: ID, from: 1, to: 2, holdHarmless: true, gain: 3, same: 20, lose: 4, meanChange: 12 },
      'moved from version 1 to version 2; 3 gain, 4 would lose and are held, 20 stay',
    ],
    [
      { moveId: ID, from: 2, to: 1, holdHarmless: false, gain: 0, same: 1, lose: 2, meanChange: -9 },
      'moved from version 2 to version 1; 0 gain, 2 lose, 1 stay',
    ],
    [{ undone: ID, from: 2, to: 1, attempts: 23 }, 'a move undone: back from version 2 to version 1'],
    [{ made: 'Peg rack' }, '“Peg rack”'],
    [{ made: 'Peg rack', starter: 'wall-rack' }, '“Peg rack”, a copy of the starter wall-rack'],
    [{ copied: 'Peg rack', fromPractical: ID, fromVersion: ID }, 'a copy of “Peg rack”'],
    [{ imported: 'Peg rack' }, '“Peg rack”, from a file'],
    [{ madeVariant: 'Peg rack B', fromPractical: ID }, '“Peg rack B”, a variant'],
    [
      { exported: 'Peg rack', version: 2, file: 'peg-rack-2.json' },
      '“Peg rack”, version 2; file peg-rack-2.json',
    ],
    [
      { exported: 'Peg rack', version: 'draft', file: 'peg-rack.json' },
      '“Peg rack”, the draft; file peg-rack.json',
    ],
    [{ published: 'Peg rack', version: 3 }, 'version 3 of “Peg rack” published'],
    [
      { published: 'Peg rack', version: 3, differenceReason: 'Softer wood.' },
      'version 3 of “Peg rack” published; why it differs from the department’s: Softer wood.',
    ],
    [{ offered: 'Peg rack' }, '“Peg rack” offered to the department'],
    [{ withdrawn: 'Peg rack' }, '“Peg rack” not on offer any more'],
    [{ putAway: 'Peg rack' }, '“Peg rack” put away'],
    [{ broughtBack: 'Peg rack' }, '“Peg rack” brought back'],
    [
      { tookOver: 'Peg rack', version: 4, fromVersion: ID },
      'version 4 of its original taken into “Peg rack”',
    ],
    [
      { putBack: 'Peg rack', insteadOfVersion: 4, fromVersion: null },
      'the draft of “Peg rack” put back in place of version 4 of its original',
    ],
    [{ tookBackVersion: 1, keptDraft: 7 }, 'version 1 taken back into the draft'],
    [{ keptDraft: 7 }, 'the draft kept, change 7'],
    [{ approved: 'Peg rack', version: 2, ended: 0 }, 'version 2 of “Peg rack” approved'],
    [{ approved: 'Peg rack', version: 2, ended: 1 }, 'version 2 of “Peg rack” approved in place of another'],
    [{ approvalEnded: 'Peg rack', version: 2 }, 'the approval of version 2 of “Peg rack” ended'],
    [{ modifiedRubric: 'ended' }, 'a modified rubric ended'],
  ])('%j', (details, sentence) => expect(sayDetails(details)).toBe(sentence));

  test('with what it was about in front, unless the sentence names it', () => {
    expect(sayDetails({ undone: ID, from: 2, to: 1 }, 'Peg rack, period 3')).toBe(
      'Peg rack, period 3: a move undone: back from version 2 to version 1',
    );
    expect(sayDetails({ imported: 'Peg rack' }, 'Peg rack')).toBe('“Peg rack”, from a file');
  });

  test('name by name where no sentence fits, without ids', () => {
    expect(sayDetails({ roles: ['teacher', 'head'], again: true, sittingId: ID })).toBe(
      'roles: teacher, head; again: yes',
    );
    expect(sayDetails(null, 'Peg rack, period 3')).toBe('Peg rack, period 3');
    expect(sayDetails({ students: 23 }, 'Peg rack, period 3')).toBe('Peg rack, period 3; students: 23');
    expect(sayAction('sitting.move')).toBe('moved a sitting to another version');
  });
});
