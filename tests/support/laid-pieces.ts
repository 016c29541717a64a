import fc from 'fast-check';
import { type Length, MAX_LENGTH } from '@/lib/length';
import type { Axis, LaidPiece, Line, ProposedMatch, Rubric } from '@/lib/scoring';
import { everyAssignment } from './every-assignment';
import { rubricArb } from './scoring-arbitraries';
import { makeAttempt, makePiece } from './scoring-examples';
import { scoreByOracle } from './scoring-oracle';

const AXES: Axis[] = ['thickness', 'width', 'length'];

/** A size on an edge of the line's bands or of the gross limit, or a tick to either side. */
function sizeArb(rubric: Rubric, line: Line, axis: Axis): fc.Arbitrary<Length> {
  const { over, under } = line.sizes[axis];
  const edges = [0, ...[...over, ...under].map(({ within }) => within), rubric.grossLimit ?? 0];
  return fc
    .tuple(fc.constantFrom(...edges), fc.constantFrom(-1, 1), fc.constantFrom(-1, 0, 0, 1), fc.boolean())
    .map(([edge, side, tick, withMargin]) => {
      const off = edge + (withMargin ? rubric.margin : 0);
      return Math.min(MAX_LENGTH, Math.max(1, line.target[axis] + side * off + tick));
    });
}

function sizesArb(rubric: Rubric): fc.Arbitrary<LaidPiece['sizes']> {
  return fc.constantFrom(...rubric.lines).chain((line) => {
    const [thickness, width, length] = [
      sizeArb(rubric, line, 'thickness'),
      sizeArb(rubric, line, 'width'),
      sizeArb(rubric, line, 'length'),
    ];
    const laid = fc.record({ thickness, width, length });
    const turned = laid.map((sizes) => ({ ...sizes, thickness: sizes.width, width: sizes.thickness }));
    return fc.oneof({ weight: 3, arbitrary: laid }, { weight: 1, arbitrary: turned });
  });
}

/** Few different sizes on few lines, so that pieces compete and equals are common. */
export const laidArb: fc.Arbitrary<{ rubric: Rubric; pieces: LaidPiece[] }> = rubricArb
  .map((rubric) => ({
    ...rubric,
    lines: rubric.lines.map((line) => ({ ...line, quantity: Math.min(2, line.quantity) })),
  }))
  .chain((rubric) =>
    fc
      .array(sizesArb(rubric), { minLength: 1, maxLength: 3 })
      .chain((pool) => fc.array(fc.constantFrom(...pool), { maxLength: 4 }))
      .map((all) => ({ rubric, pieces: all.map((sizes, at) => ({ id: `p${at}`, sizes })) })),
  );

interface Fit {
  lose: number;
  off: Length;
}

/** What the piece comes to as the only piece of the line; null where it is gross. */
function fitByOracle(rubric: Rubric, line: Line, { sizes }: LaidPiece): Fit | null {
  const alone: Rubric = { ...rubric, lines: [{ ...line, quantity: 1, set: 'each' }] };
  const piece = scoreByOracle(alone, makeAttempt([makePiece(line.id, 1, sizes)])).pieces[0];
  if (!piece?.sizes || piece.gross) return null;
  const { sizes: scored } = piece;
  return {
    lose: piece.lose,
    off: AXES.reduce((sum, axis) => sum + Math.abs(scored[axis].deviation ?? 0), 0),
  };
}

function compare(one: number[], other: number[]): number {
  const at = one.findIndex((value, index) => value !== other[index]);
  return at < 0 ? 0 : (one[at] ?? 0) - (other[at] ?? 0);
}

/** The first of all possible proposals, every one of them looked at. */
export function proposeByLooking(rubric: Rubric, pieces: LaidPiece[]): ProposedMatch {
  const places = rubric.lines.flatMap((line) =>
    Array.from({ length: line.quantity }, (_, at) => ({ line, lineId: line.id, ordinal: at + 1 })),
  );
  const fits = pieces.map((piece) => places.map(({ line }) => fitByOracle(rubric, line, piece)));
  const capacities = [...places.map(() => 1), pieces.length];
  const [best] = everyAssignment(pieces.length, capacities)
    .filter((columns) => columns.every((at, row) => at === places.length || fits[row]?.[at]))
    .map((columns) => {
      const filled = columns.flatMap((at, row) => fits[row]?.[at] ?? []);
      const lose = filled.reduce((sum, fit) => sum + fit.lose, 0);
      const off = filled.reduce((sum, fit) => sum + fit.off, 0);
      return { columns, rank: [columns.length - filled.length, lose, off, ...columns] };
    })
    .toSorted((a, b) => compare(a.rank, b.rank));
  const columns = best?.columns ?? [];
  return {
    placed: pieces.flatMap(({ id }, row) => {
      const [place, fit] = [places[columns[row] ?? -1], fits[row]?.[columns[row] ?? -1]];
      return place && fit ? [{ id, lineId: place.lineId, ordinal: place.ordinal, lose: fit.lose }] : [];
    }),
    unplaced: pieces.flatMap(({ id }, row) => (columns[row] === places.length ? [id] : [])),
    unfilled: places.flatMap(({ lineId, ordinal }, at) =>
      columns.includes(at) ? [] : [{ lineId, ordinal }],
    ),
  };
}
