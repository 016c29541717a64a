import { AXES, type Axis, type Band, type Line, type Points, type Rubric, type SizeRule } from '../types';
import type { Remark, ReviewRule } from './finding';
import { sayAmount, sayLength, sayLine, sayPoints } from './review-words';

type Side = 'over' | 'under';

const SIDES: readonly Side[] = ['over', 'under'];

/** What a rule has to say of one dimension of one line, or null. */
type SizeRemark = (rule: SizeRule, rubric: Rubric, line: Line) => string | null;

function eachSize(rubric: Rubric, remark: SizeRemark): Remark[] {
  return rubric.lines.flatMap((line) =>
    AXES.flatMap((axis: Axis): Remark[] => {
      const text = remark(line.sizes[axis], rubric, line);
      return text === null ? [] : [{ lineId: line.id, axis, text: `${sayLine(line)}, ${axis}: ${text}` }];
    }),
  );
}

/** The side or sides of a dimension for which something holds, in words; null for neither. */
function sidesWhere(holds: (side: Side) => boolean): string | null {
  const sides = SIDES.filter(holds);
  return sides.length === 0 ? null : sides.join(' and ');
}

/** The edges of the bands of one side that are narrower than the graduation. */
function narrowEdges(bands: readonly Band[], rubric: Rubric, graduation: number): string {
  return bands
    .filter(({ within }, index) => within - (bands[index - 1]?.within ?? -rubric.margin) < graduation)
    .map(({ within }) => sayLength(within, rubric))
    .join(', ');
}

export const findNarrowBands: ReviewRule = (rubric, graduation) =>
  eachSize(rubric, (rule) => {
    const [over, under] = [rule.over, rule.under].map((bands) => narrowEdges(bands, rubric, graduation));
    if (!over && !under) return null;
    const both = over === under ? `${over} over and under` : '';
    const sides = [over && `${over} over`, under && `${under} under`].filter(Boolean).join(' and ');
    return (
      `bands narrower than the ${sayLength(graduation, rubric)} that is read: up to ${both || sides}. ` +
      'Widen them, or have this size read with a finer instrument.'
    );
  });

export const findNoFreeBand: ReviewRule = (rubric) =>
  eachSize(rubric, (rule) => {
    const sides = sidesWhere((side) => rule[side][0]?.within === 0);
    if (sides === null) return null;
    const free = rubric.margin > 0 ? 'only the reading margin' : 'nothing but the exact size';
    return `${free} is free ${sides}. Give the first band a distance that cutting to a line can hold.`;
  });

/** Past its last band a dimension loses this, on the side that loses less. */
function leastBeyond({ beyondOver, beyondUnder, cap }: SizeRule): { side: Side; lose: Points } {
  const lose = Math.min(beyondOver, beyondUnder, cap ?? Number.POSITIVE_INFINITY);
  return { side: beyondOver <= beyondUnder ? 'over' : 'under', lose };
}

export const findOneWrong: ReviewRule = (rubric) =>
  eachSize(rubric, (rule, _, { worth }) => {
    const { side, lose } = leastBeyond(rule);
    if (4 * lose >= worth) return null;
    return (
      `past the last band ${side}, a piece loses ${sayAmount(lose)} of ${sayPoints(worth)} and keeps more than ` +
      'three quarters. Raise the price beyond the bands, or lower the worth, if such a piece should keep less.'
    );
  });

/** Where one side changes its price, and to what: bands that change nothing left out, the cap taken off. */
function priceChanges(bands: readonly Band[], beyond: Points, cap: Points | null): string {
  const prices = [...bands.map(({ lose }) => lose), beyond].map((lose) => Math.min(lose, cap ?? lose));
  const changes = bands.flatMap(({ within }, index) =>
    prices[index] === prices[index + 1] ? [] : [`${within}: ${prices[index + 1]}`],
  );
  return changes.join();
}

export const findSymmetric: ReviewRule = (rubric) =>
  eachSize(rubric, ({ over, under, beyondOver, beyondUnder, cap }) => {
    const changes = priceChanges(under, beyondUnder, cap);
    if (changes === '' || changes !== priceChanges(over, beyondOver, cap)) return null;
    return 'over and under lose alike. If too small should cost more, since wood cannot be put back, make under dearer.';
  });

export const findGrossInBand: ReviewRule = (rubric) =>
  eachSize(rubric, (rule) => {
    const { grossLimit } = rubric;
    if (grossLimit === null) return null;
    const reach = Math.max(rule.over.at(-1)?.within ?? 0, rule.under.at(-1)?.within ?? 0);
    if (reach <= grossLimit) return null;
    return (
      `the bands reach ${sayLength(reach, rubric)}, but past ${sayLength(grossLimit, rubric)} a piece is gross and ` +
      'loses its worth. Raise the gross limit, or end the bands before it.'
    );
  });
