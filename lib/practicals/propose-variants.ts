import { chooseApart } from './propose-variants-choose';
import { groupSizes, leastStep } from './propose-variants-groups';
import { withReach } from './propose-variants-lent';
import { cutListOf, findCandidates, lineThatStays } from './propose-variants-search';
import type { Stop, VariantProposals, VariantQuestion } from './propose-variants-types';
import { wordsOfProposal, wordsOfStop } from './propose-variants-words';

/**
 * Other target sizes for the same practical, so that a piece borrowed from another period does not fit. The product's
 * rule, which calls such sizes equally difficult: the same pieces at the same prices; thicknesses stay, and with them
 * every size that equals one, for the stock is given; widths and lengths move by whole graduations, equal sizes
 * together, none by more than a quarter of itself, and all keep their order of size; the wood (thickness × width ×
 * (length + kerf)) stays within 8 percent of the original's, and the blank still yields it in whole strips. Between
 * any two of the variants, the original and `others`, every piece laid for any line, thickness and width exchanged
 * where the line allows it, is off on some axis by more than the gross limit, or twice the last band if there is none,
 * margin and rounding of readings included. The smallest moves come first.
 * Lengths in ticks; nothing is rounded; no randomness: the same question has the same answer. Where fewer than `count`
 * are found, `stopped` names the line that stops the next. The search is bounded, so of a long cut list it may find
 * fewer than there are. Throws a RangeError for a count outside 1 to 6 or a graduation below 1.
 *
 * @example
 * proposeVariants({ task, rubric, others: [], count: 1, graduation: TICKS_PER_INCH / 8 }).proposals.length // 1
 */
export function proposeVariants(question: VariantQuestion): VariantProposals {
  const { task, rubric, count, graduation } = question;
  if (!Number.isInteger(count) || count < 1 || count > 6) throw new RangeError('Propose 1 to 6 variants.');
  if (!Number.isInteger(graduation) || graduation < 1)
    throw new RangeError('A graduation is a whole length.');
  const priced = withReach(rubric);
  const step = leastStep(priced, graduation);
  const groups = groupSizes(task, priced, step);
  const others = [{ name: 'the original', cutList: task.cutList }, ...question.others];
  const fixed = lineThatStays(priced, groups);
  const { candidates, stop } = fixed
    ? { candidates: [], stop: fixed }
    : findCandidates({ task, priced, groups, others });
  const choice = chooseApart(candidates, count);
  const proposals = choice.chosen.map(({ lines }) => {
    const cutList = cutListOf(lines);
    return { cutList, words: wordsOfProposal(task, cutList) };
  });
  return { proposals, step, stopped: stoppedBy(stop ?? choice.stop) };

  function stoppedBy(by: Stop | null): VariantProposals['stopped'] {
    const line = by && rubric.lines[by.line];
    return by && line ? { lineId: line.id, words: wordsOfStop(rubric, by, step) } : null;
  }
}
