import fc from 'fast-check';
import { TICKS_PER_INCH } from '@/lib/length';
import { parseDraft } from '@/lib/practicals/parse-draft';
import type { VariantQuestion } from '@/lib/practicals/propose-variants-types';
import type { StarterId } from '@/lib/practicals/starter-plans';
import { starterDraft } from '@/lib/practicals/starters';
import type { Task } from '@/lib/practicals/task';
import { type Axis, compileRubric, defaultRubricForm, type Rubric, scoreAttempt } from '@/lib/scoring';
import type { CutList } from '@/lib/scoring/rubric-form';

export function starter(id: StarterId) {
  const read = parseDraft(starterDraft(id));
  if (!read.ok) throw new Error(JSON.stringify(read.errors));
  return read;
}

/** What becomes of a piece of these sizes that is handed in for a line, as the scoring engine itself says. */
export function handedIn(sizes: Record<Axis, number>, rubric: Rubric, lineId: string) {
  const value = (ticks: number) => ({ kind: 'value' as const, ticks });
  const piece = {
    lineId,
    ordinal: 1,
    state: 'present' as const,
    sizes: {
      thickness: value(sizes.thickness),
      width: value(sizes.width),
      length: value(sizes.length),
    },
    checks: {},
  };
  const sheet = scoreAttempt(rubric, { pieces: [piece], work: {}, bonus: 0, daysLate: 0 });
  const found = sheet.pieces.find((each) => each.lineId === lineId && each.ordinal === 1);
  const bands = Object.values(found?.sizes ?? {}).map(({ band }) => band);
  return { gross: found?.gross ?? false, beyond: bands.includes('beyond') };
}

/** The rubric with another cut list's sizes. */
export function pricedFor(rubric: Rubric, { lines }: CutList): Rubric {
  return {
    ...rubric,
    lines: rubric.lines.map((line, index) => ({ ...line, target: lines[index]?.target ?? line.target })),
  };
}

const eighths = (count: number) => (count * TICKS_PER_INCH) / 8;

const lineArb = fc.record({
  quantity: fc.integer({ min: 1, max: 4 }),
  thickness: fc.constantFrom(4, 6),
  width: fc.integer({ min: 6, max: 32 }),
  length: fc.integer({ min: 16, max: 120 }),
});

/** Tasks on eighths of an inch, with and without a blank, a gross limit, a rounding of readings and an exchange. */
export const questionArb: fc.Arbitrary<VariantQuestion> = fc
  .record({
    lines: fc.array(lineArb, { minLength: 1, maxLength: 5 }),
    blank: fc.option(
      fc.record({ width: fc.integer({ min: 30, max: 80 }), length: fc.integer({ min: 130, max: 300 }) }),
    ),
    gross: fc.option(fc.constantFrom(1, 2, 3)),
    readTo: fc.option(fc.constantFrom(TICKS_PER_INCH / 64, TICKS_PER_INCH / 100)),
    swap: fc.boolean(),
    count: fc.integer({ min: 1, max: 6 }),
    graduation: fc.constantFrom(eighths(1), eighths(2)),
  })
  .map(({ lines, blank, gross, readTo, swap, count, graduation }) => {
    const form = defaultRubricForm('in');
    form.grossLimit = gross === null ? null : eighths(gross);
    form.readTo = readTo;
    form.defaults.swap = swap;
    const cutList: CutList = {
      lines: lines.map(({ quantity, thickness, width, length }, index) => ({
        id: `part-${index + 1}`,
        label: `part ${index + 1}`,
        quantity,
        target: { thickness: eighths(thickness), width: eighths(width), length: eighths(length) },
      })),
    };
    const task: Task = {
      title: 'Generated',
      unit: 'in',
      instructions: '',
      material: '',
      blank: blank && { thickness: eighths(7), width: eighths(blank.width), length: eighths(blank.length) },
      kerf: eighths(1),
      cutList,
      lineNotes: {},
    };
    return { task, rubric: compileRubric(form, cutList), others: [], count, graduation };
  });
