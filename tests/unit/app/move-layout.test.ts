import fc from 'fast-check';
import { describe, expect, it } from 'vitest';
import { layOutMoves, type Mover } from '@/app/(teacher)/sittings/[sittingId]/move/_components/move-layout';

const mover = (name: string, before: number, after: number): Mover => ({
  key: name,
  name,
  before: before * 100,
  after: after * 100,
});

const movers = fc.array(
  fc.record({
    before: fc.integer({ min: 0, max: 10_000 }),
    after: fc.integer({ min: 0, max: 10_000 }),
    letters: fc.integer({ min: 1, max: 60 }),
  }),
  { maxLength: 320 },
);

describe('the picture of who moves', () => {
  it('draws a drop to the left and a gain to the right, drops above gains, each group from the highest down', () => {
    const layout = layOutMoves(
      [mover('low gain', 70, 72), mover('drop', 90, 85), mover('high gain', 80, 81), mover('stay', 88, 88)],
      10_000,
      640,
    );
    expect(layout.strokes.map(({ key }) => key)).toEqual(['drop', 'high gain', 'low gain']);
    for (const { side, from, to } of layout.strokes)
      expect(Math.sign(to - from)).toBe(side === 'drop' ? -1 : 1);
    expect(layout.strokes.map(({ figure }) => figure.text)).toEqual(['−5', '+1', '+2']);
    expect(layout.groups.map(({ words, count }) => [words, count])).toEqual([
      ['drop', 1],
      ['gain', 2],
      ['stay', 1],
    ]);
    expect(layout.squares).toHaveLength(1);
  });

  it('puts every stroke where the rule says it is', () => {
    const { strokes, marks } = layOutMoves([mover('a', 80, 85)], 10_000, 640);
    const at = (value: number) => marks.find((mark) => mark.value === value)?.x;
    expect(strokes[0]?.from).toBe(at(80));
    expect(strokes[0]?.to).toBe(at(85));
  });

  it('names the strokes of a class of 8 and of 32, and only in a larger one leaves the names to the table', () => {
    const named = (count: number) =>
      layOutMoves(
        Array.from({ length: count }, (_, index) => mover(`student ${index}`, 60 + (index % 30), 91)),
        10_000,
        640,
      );
    expect(named(8).strokes.every(({ name }) => name !== null)).toBe(true);
    expect(named(32).strokes.every(({ name }) => name !== null)).toBe(true);
    const crowd = named(300);
    expect(crowd.strokes).toHaveLength(300);
    expect(crowd.strokes.every(({ name }) => name === null)).toBe(true);
    expect(crowd.height).toBeLessThan(900);
  });

  it('keeps everything on the paper, at both widths, whoever moves', () => {
    fc.assert(
      fc.property(movers, fc.constantFrom(358, 640), (drawn, width) => {
        const layout = layOutMoves(
          drawn.map(({ before, after, letters }, index) => ({
            key: String(index),
            name: 'x'.repeat(letters),
            before,
            after,
          })),
          10_000,
          width,
        );
        const lower = layout.groups.reduce((sum, group) => sum + group.lower, 0);
        expect(layout.strokes.length + layout.squares.length + lower).toBe(drawn.length);
        for (const { from, to, y, name, figure } of layout.strokes) {
          expect(Math.min(from, to)).toBeGreaterThanOrEqual(0);
          expect(Math.max(from, to)).toBeLessThanOrEqual(width);
          expect(y).toBeGreaterThan(layout.edge);
          expect(y).toBeLessThan(layout.base);
          for (const words of name ? [name, figure] : []) {
            const end = words.x + (words.anchor === 'start' ? 1 : -1) * words.text.length * 7.2;
            expect(end).toBeGreaterThan(-8);
            expect(end).toBeLessThan(width + 8);
          }
        }
        for (const { x, y } of layout.squares) {
          expect(x).toBeGreaterThanOrEqual(0);
          expect(x + layout.square).toBeLessThanOrEqual(width);
          expect(y).toBeLessThan(layout.base);
        }
      }),
      { numRuns: 200 },
    );
  });

  it('says how many stay below its stretch instead of drawing them where they are not', () => {
    const { squares, groups } = layOutMoves(
      [mover('a', 92, 90), mover('zero', 0, 0), mover('b', 91, 91), mover('above', 102, 102)],
      10_000,
      640,
    );
    expect(squares.map(({ key }) => key)).toEqual(['b', 'above']);
    expect(groups.at(-1)).toMatchObject({ words: 'stay', count: 3, lower: 1 });
  });

  it('marks any total without crowding the rule', () => {
    for (const total of [2000, 6300, 10_000, 45_000, 500_000]) {
      for (const width of [358, 640]) {
        const layout = layOutMoves([{ key: 'a', name: 'a', before: 0, after: total }], total, width);
        expect(layout.marks.length).toBeLessThanOrEqual(61);
        const numbered = layout.marks.filter((mark) => mark.numbered).map(({ x }) => x);
        expect(numbered.length).toBeGreaterThan(1);
        for (const [index, x] of numbered.entries()) {
          if (index > 0) expect(x - (numbered[index - 1] ?? 0)).toBeGreaterThan(20);
        }
      }
    }
  });
});
