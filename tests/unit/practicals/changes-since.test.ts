import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { z } from 'zod';
import { lengthAsTyped } from '@/lib/practicals/as-typed';
import { changesSince } from '@/lib/practicals/changes-since';
import type { Phrase } from '@/lib/practicals/compare-types';
import { type Task, taskSchema } from '@/lib/practicals/task';
import { AXES, compileRubric, type RubricForm, rubricFormSchema, type Share } from '@/lib/scoring';
import { comparedStarter } from '@/tests/support/compared';
import { formArb } from '@/tests/support/form-arbitraries';
import { type Change, changesOf } from '@/tests/support/one-change';
import { defaultTask, NINE_PIECES } from '@/tests/support/rubrics';

interface Authored {
  task: Task;
  form: RubricForm;
}

const written = ({ task, form }: Authored) => ({ task, form, rubric: compileRubric(form, task.cutList) });

const told = (before: Authored, now: Authored) =>
  changesSince({ ...written(before), number: 1 }, written(now));

const inWords = (phrase: Phrase) =>
  phrase.map((part) => (typeof part === 'string' ? part : lengthAsTyped(part.ticks, 'in'))).join('');

/** What a reader and an attempt could tell two versions by; 2/4 reads as 1/2. */
function effectOf({ task, form }: Authored): string {
  const { late, redo, prediction } = form.policies;
  const share = ({ num, den }: Share) => num / den;
  const { agreeShare, caughtShare, valueShare, ...amounts } = prediction;
  const shares = [agreeShare, caughtShare, valueShare].map(share);
  return JSON.stringify([task, compileRubric(form, task.cutList), late, redo, amounts, shares]);
}

/** The authored pair if it is one that could be stored. */
function storable(value: unknown): Authored | null {
  const read = z.object({ task: taskSchema, form: rubricFormSchema }).safeParse(value);
  return read.success ? read.data : null;
}

const anyPair = z.object({
  task: z.record(z.string(), z.unknown()),
  form: z.record(z.string(), z.unknown()),
});

/** Some fields hold only together: a basis with its start, one unit for task and prices. */
function withPartner({ value, path }: Change): unknown {
  const read = anyPair.safeParse(value);
  if (!read.success) return value;
  const { task, form } = read.data;
  if (path === 'task.unit') return { task, form: { ...form, unit: task.unit } };
  if (path === 'form.unit') return { task: { ...task, unit: form.unit }, form };
  if (path === 'form.basis') return { task, form: { ...form, start: form.basis === 'start' ? 9_000 : null } };
  return value;
}

const task: Task = { ...defaultTask(NINE_PIECES.slice(0, 2)), lineNotes: { end: 'grain up' } };
const pattern = (path: string) =>
  path
    .replaceAll(/\.\d+/g, '[]')
    .replaceAll(/(exceptions|lineNotes)\.[a-z]+/g, '$1.*')
    .replaceAll(/(over|under)\[\]/g, 'side[]');

const WITHOUT_EFFECT = ['form.format', 'form.presets'];

describe('what a version changes', () => {
  it('is told for every single field of task and form that can be another, and only then', () => {
    const changed = new Set<string>();
    const seen = new Set<string>();
    fc.assert(
      fc.property(formArb(task.cutList), (given) => {
        const before = { task, form: { ...given, unit: task.unit } };
        const effect = effectOf(before);
        for (const change of changesOf(before)) {
          if (change.isLeaf) seen.add(pattern(change.path));
          const now = storable(withPartner(change));
          if (!now) continue;
          changed.add(pattern(change.path));
          const isSame = effect === effectOf(now);
          const words = told(before, now);
          expect(words.length > 0, `${change.path}: ${JSON.stringify(words)}`).toBe(!isSame);
        }
      }),
      { numRuns: 3, seed: 20_261_201, endOnFailure: true },
    );
    const never = [...seen].filter((path) => !changed.has(path) && !WITHOUT_EFFECT.includes(path));
    expect(never, 'fields that no change was tried on').toEqual([]);
    expect(changed.size).toBeGreaterThan(60);
  }, 30_000);

  it('is nothing when nothing changed', () => {
    fc.assert(
      fc.property(formArb(task.cutList), (form) => {
        expect(told({ task, form }, structuredClone({ task, form }))).toEqual([]);
      }),
      { numRuns: 20 },
    );
  });
});

describe('a change in words', () => {
  const before = { ...comparedStarter('version 1'), number: 1 };
  const words = (change: Parameters<typeof comparedStarter>[1]) =>
    changesSince(before, comparedStarter('now', change)).map(inWords);

  it('goes by the number of the version where it has one, else by the next', () => {
    const dearer = (number?: number) => {
      const now = comparedStarter('now', (draft) => {
        for (const axis of AXES) draft.all.sizes[axis].under.beyond = '5';
      });
      return changesSince(before, { ...now, number })
        .map(inWords)
        .join(' ');
    };
    expect(dearer()).toContain('Version 2 ');
    expect(dearer(7)).toContain('Version 7 ');
  });

  it('names what is and what was, of the task', () => {
    expect(
      words((draft) => {
        draft.title = 'Caddy';
        draft.material = 'beech';
        draft.kerf = '3/32';
        draft.blank.length = '24';
        Object.assign(draft.lines[0] ?? {}, { label: 'bottom', note: 'no knots' });
      }),
    ).toEqual([
      'Title: now “Caddy”, was “Desk caddy”.',
      'Wood: now “beech”, was “alder”.',
      'Blank: now 5/8 × 6 × 24, was 5/8 × 6 × 22 1/2.',
      'Kerf: now 3/32, was 1/8.',
      'Name of a line: now “bottom”, was “base”.',
      'Note of bottom: now “no knots”, was none.',
    ]);
  });

  it('names lines that come, go, change in size, number and order', () => {
    expect(
      words((draft) => {
        const [base, ends, sides] = draft.lines.splice(0, 3);
        if (!base || !ends || !sides) return;
        ends.quantity = '3';
        ends.length = '4 1/4';
        draft.lines.push(ends, { ...sides, id: 'rails', label: 'rails' });
      }),
    ).toEqual([
      'Line taken out: base, 1 piece of 1/2 × 3 1/2 × 7.',
      'Line taken out: side, 2 pieces of 1/2 × 2 × 7.',
      'Line added: rails, 2 pieces of 1/2 × 2 × 7.',
      'Pieces of end: now 3, was 2.',
      'Length of end: now 4 1/4, was 4.',
      'Order of the lines: now divider, end, rails.',
    ]);
  });

  it('names the size and side that costs otherwise, exceptions by their line', () => {
    expect(
      words((draft) => {
        draft.all.sizes.width.over.beyond = '5';
        draft.all.sizes.width.mirrored = false;
        Object.assign(draft.lines[1] ?? {}, { worth: '12' });
      }),
    ).toEqual([
      'Version 2 takes 2 points more than version 1 for every width over, past 3/32.',
      'Worth of a piece, end: now 12, was 9.',
      'A missing piece, end: now 12, was 9.',
      'Points in all: now 69, was 63.',
    ]);
  });

  it('says so when bands are divided otherwise and no deviation costs otherwise', () => {
    expect(
      words((draft) => {
        for (const side of ['over', 'under'] as const) {
          draft.all.sizes.length[side].bands.unshift({ within: '1/64', lose: '0' });
        }
      }),
    ).toEqual(['Bands of every length: divided otherwise, at the same prices.']);
  });

  it('names checks, lateness, redo and prediction', () => {
    expect(
      words((draft) => {
        const [square] = draft.all.checks;
        if (square) Object.assign(square, { label: 'squareness', assume: null });
        draft.workChecks = [];
        draft.late = { perDay: '5', max: '20' };
        draft.redo.capPercent = '80';
        draft.prediction.agreeShare = '80%';
        draft.reading.margin = '0';
      }),
    ).toEqual([
      'Name of a check of every piece: now “squareness”, was “square”.',
      'Check of every piece, squareness: now good 0, not good 1; nothing taken for granted, was good 0, not good 1; taken as good.',
      'Check of the whole work taken out: name and period on pieces.',
      'Reading margin: now 0, was 0.002.',
      'Late work: now 5% a day, 20% at most, was no loss.',
      'A redo counts up to: now 80%, was 90%.',
      'Sizes that must agree: now 80%, was 90%.',
    ]);
  });

  it('quotes the paragraphs of the instructions that come and go', () => {
    expect(
      words((draft) => {
        draft.instructions = `${draft.instructions}\n\nWrite your name on every piece.`;
      }),
    ).toEqual(['Instructions: added “Write your name on every piece.”.']);
  });
});
