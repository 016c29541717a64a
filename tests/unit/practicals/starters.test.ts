import { describe, expect, it } from 'vitest';
import { draftOf } from '@/lib/practicals/draft-of';
import { parseDraft } from '@/lib/practicals/parse-draft';
import { STARTER_IDS } from '@/lib/practicals/starter-plans';
import { listStarters, starterDraft } from '@/lib/practicals/starters';
import { countTask } from '@/lib/practicals/task';
import { AXES, type Axis } from '@/lib/scoring';
import { ticksOf } from '@/tests/support/rubrics';

/** What the demo scenario asks for: blank, then pieces and size of each line. */
const SCENARIO: Record<
  (typeof STARTER_IDS)[number],
  [blank: string, lines: [pieces: number, size: string][]]
> = {
  'bench-hook': [
    '3/4 x 7 x 13',
    [
      [1, '3/4 x 4-1/2 x 9'],
      [1, '3/4 x 1-1/4 x 5'],
      [1, '3/4 x 1-1/4 x 4-1/4'],
      [2, '3/4 x 3/4 x 3'],
    ],
  ],
  'six-stick': [
    '7/8 x 1-7/8 x 15',
    [
      [6, '3/4 x 3/4 x 3-3/4'],
      [1, '3/4 x 3/4 x 1-1/2'],
    ],
  ],
  'desk-caddy': [
    '5/8 x 6 x 22-1/2',
    [
      [1, '1/2 x 3-1/2 x 7'],
      [2, '1/2 x 3-1/2 x 4'],
      [2, '1/2 x 2 x 7'],
      [2, '1/2 x 2 x 3-1/2'],
    ],
  ],
  'stair-tower': [
    '1-1/4 x 1-1/2 x 18-1/2',
    ['1-1/2', '1-3/4', '2', '2-1/4', '2-1/2', '2-3/4', '3'].map((length) => [1, `1 x 1-1/4 x ${length}`]),
  ],
  'wall-rack': [
    '35 x 85 x 560',
    [
      [2, '35 x 35 x 180'],
      [1, '35 x 35 x 120'],
      [6, '13 x 35 x 260'],
    ],
  ],
  'gauge-kit': [
    '24 x 105 x 430',
    [
      [2, '24 x 50 x 65'],
      [2, '16 x 16 x 220'],
      [2, '10 x 16 x 80'],
    ],
  ],
};

const sizeOf = (text: string, unit: 'in' | 'mm'): Record<Axis, number> => {
  const [thickness = '', width = '', length = ''] = text.split(' x ').map((each) => each.trim());
  return {
    thickness: ticksOf(thickness, unit),
    width: ticksOf(width, unit),
    length: ticksOf(length, unit),
  };
};

const volume = (size: Record<Axis, number>): number =>
  AXES.reduce((product, axis) => product * (size[axis] / 1e7), 1);

const parsed = (id: (typeof STARTER_IDS)[number]) => {
  const read = parseDraft(starterDraft(id));
  if (!read.ok) throw new Error(JSON.stringify(read.errors));
  return read;
};

describe.each(STARTER_IDS)('the starter %s', (id) => {
  it('can be published as it stands', () => {
    expect(parseDraft(starterDraft(id))).toMatchObject({ ok: true });
  });

  it('asks for the blank and the pieces of the scenario', () => {
    const { task } = parsed(id);
    const [blank, lines] = SCENARIO[id];
    expect(task.blank).toEqual(sizeOf(blank, task.unit));
    expect(task.cutList.lines.map(({ quantity, target }) => [quantity, target])).toEqual(
      lines.map(([pieces, size]) => [pieces, sizeOf(size, task.unit)]),
    );
    expect(task.kerf).toBe(ticksOf(task.unit === 'in' ? '1/8' : '3', task.unit));
  });

  it('has a blank with more wood than its pieces', () => {
    const { task } = parsed(id);
    const wood = task.cutList.lines.reduce((sum, line) => sum + line.quantity * volume(line.target), 0);
    expect(task.blank && volume(task.blank)).toBeGreaterThan(wood);
  });

  it('tells what to do, and comes back as it was from what is published of it', () => {
    const { task, form } = parsed(id);
    expect(task.instructions.length).toBeGreaterThan(80);
    expect(draftOf(task, form)).toEqual(starterDraft(id));
  });

  it('is counted in the list as it is', () => {
    const { task } = parsed(id);
    expect(listStarters().find((each) => each.id === id)).toMatchObject({
      title: task.title,
      unit: task.unit,
      lines: task.cutList.lines.length,
      pieces: countTask(task).pieces,
    });
  });
});

it('prices the sticks of the puzzle in 64ths, and twice as dear over the size', () => {
  const { form, rubric } = parsed('six-stick');
  expect(form.presets).toEqual(['oversize-doubles']);
  for (const line of rubric.lines) {
    for (const axis of AXES) {
      expect(line.sizes[axis]).toEqual({
        over: [0, 200, 400].map((lose, index) => ({ within: ticksOf(`${index + 1}/64`), lose })),
        under: [0, 100, 200].map((lose, index) => ({ within: ticksOf(`${index + 1}/64`), lose })),
        beyondOver: 600,
        beyondUnder: 300,
        cap: null,
      });
    }
  }
});
