import { describe, expect, it } from 'vitest';
import {
  changeUnder,
  choiceWords,
  countTold,
  dropsFirst,
  moversOf,
  signedPoints,
  whoMoves,
} from '@/app/(teacher)/sittings/[sittingId]/move/_components/move-words';
import type { MovedAttempt, MovePreview } from '@/lib/contracts/moves';

const attempt = (familyName: string, more: Partial<MovedAttempt> = {}): MovedAttempt => ({
  attemptId: familyName,
  studentId: familyName,
  familyName,
  givenName: 'Ana',
  attemptNumber: 1,
  before: 9000,
  after: 9000,
  held: 9000,
  change: 0,
  told: true,
  modified: false,
  ...more,
});

const DROP = attempt('Drop', { after: 8600, held: 9000, change: -400 });
const GAIN = attempt('Gain', { after: 9200, held: 9200, change: 200 });
const STAY = attempt('Stay');
const AWAY = attempt('Away', { before: null, after: null, held: null, change: null, told: false });

const preview = (students: MovedAttempt[], more: Partial<MovePreview> = {}): MovePreview => ({
  sittingId: 's',
  from: { versionId: 'v1', number: 1, total: 10_000 },
  to: { versionId: 'v2', number: 2, total: 10_000 },
  students,
  gain: students.filter(({ change }) => (change ?? 0) > 0).length,
  same: students.filter(({ change }) => change === 0).length,
  lose: students.filter(({ change }) => (change ?? 0) < 0).length,
  meanChange: -67,
  notAsked: [],
  seen: 'x',
  ...more,
});

describe('the words of a move', () => {
  it('count who gains, drops and stays, with the mean and its total', () => {
    expect(whoMoves(preview([DROP, GAIN, STAY, AWAY]))).toEqual({
      counts: '1 gains, 1 drops, 1 stays',
      mean: 'mean −0.67 of 100',
    });
    expect(whoMoves(preview([STAY])).counts).toBe('Nobody’s score changes');
  });

  it('write every change with its sign', () => {
    expect([62, -300, 0].map(signedPoints)).toEqual(['+0.62', '−3', '0']);
  });

  it('list drops first, then gains, then who stays, then who has no number', () => {
    const order = dropsFirst([AWAY, STAY, GAIN, DROP, attempt('Far', { change: -900 })]);
    expect(order.map(({ familyName }) => familyName)).toEqual(['Far', 'Drop', 'Gain', 'Stay', 'Away']);
  });

  it('say for each choice how many students it concerns', () => {
    expect(choiceWords(preview([DROP, GAIN, STAY]))).toEqual({
      asIs: '1 student drops, by 4.',
      held: '1 student keeps what version 1 gave. 1 still gains.',
    });
    expect(choiceWords(preview([GAIN])).asIs).toBe('Nobody drops as things stand.');
  });

  it('count as told only those with a published score that changes under the choice', () => {
    const students = [DROP, GAIN, STAY, AWAY, attempt('New', { told: false, change: 100 })];
    expect(countTold(students, false)).toBe(2);
    expect(countTold(students, true)).toBe(1);
    expect(changeUnder(DROP, true)).toBe(0);
    expect(changeUnder(AWAY, true)).toBeNull();
  });

  it('draw both scores on the scale of the new total', () => {
    const other = attempt('Other', { before: 4000, after: 9100, held: 9100, change: 211 });
    expect(moversOf([other, AWAY])).toEqual([
      { key: 'Other', name: 'Other, Ana', before: 8889, after: 9100 },
    ]);
  });
});
