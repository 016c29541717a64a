import type { Rubric } from '@/lib/scoring';
import type { CutList } from '@/lib/scoring/rubric-form';
import type { Phrase } from './compare-types';
import { fitsInStrips, isLikeWood, woodChange, woodOfAll } from './propose-variants-fit';
import { type NearestLent, nearestLent, withReach } from './propose-variants-lent';
import { type OtherCutList, WOOD_PERCENT } from './propose-variants-types';
import { lentWords, wordsOfProposal } from './propose-variants-words';
import type { Task } from './task';

export interface VariantJudgement {
  /** For each line the piece of another list that comes nearest to it. */
  lent: Map<string, NearestLent>;
  /** Where it leaves the rule that variants are proposed by; none of it keeps anyone from making it. */
  remarks: Phrase[];
  /** What it changes and keeps, and what becomes of a borrowed piece where none passes. */
  words: Phrase[];
}

/** Holds sizes that a teacher chose against the rule of the proposals, and each line against what could be lent to it. */
export function judgeVariant(
  task: Task,
  rubric: Rubric,
  cutList: CutList,
  others: readonly OtherCutList[],
): VariantJudgement {
  const targets = new Map(cutList.lines.map(({ id, target }) => [id, target]));
  const lines = rubric.lines.map((line) => ({ ...line, target: targets.get(line.id) ?? line.target }));
  const lent = new Map(
    withReach({ ...rubric, lines }).flatMap((line) => {
      const nearest = nearestLent(line, others, rubric.grossLimit);
      return nearest ? [[line.id, nearest] as const] : [];
    }),
  );
  const passes = passRemarks(lines, lent);
  const apart = passes.length === 0 ? [lentWords(rubric)] : [];
  return {
    lent,
    remarks: [...passes, ...stockRemarks(task, cutList)],
    words: [...wordsOfProposal(task, cutList), ...apart],
  };
}

function passRemarks(lines: Rubric['lines'], lent: VariantJudgement['lent']): Phrase[] {
  return lines.flatMap(({ id, label }): Phrase[] => {
    const nearest = lent.get(id);
    if (nearest?.verdict !== 'passes') return [];
    const off: Phrase =
      nearest.off === 0 ? ['the same size'] : ['off by no more than ', { ticks: nearest.off }];
    return [[`“${nearest.label}” of ${nearest.of} can be lent for “${label}”: it is `, ...off, '.']];
  });
}

function stockRemarks(task: Task, cutList: CutList): Phrase[] {
  const kerf = task.kerf ?? 0;
  const [wood, original] = [woodOfAll(cutList, kerf), woodOfAll(task.cutList, kerf)];
  const remarks: Phrase[] = [];
  if (!isLikeWood(wood, original)) {
    const tenths = woodChange(wood, original);
    const percent = Math.abs(tenths) / 10;
    const than = `${percent} percent ${tenths > 0 ? 'more' : 'less'} wood than the original`;
    remarks.push([`It takes ${than}; proposals stay within ${WOOD_PERCENT}.`]);
  }
  const grown = cutList.lines.some(({ target }, index) => {
    const before = task.cutList.lines[index]?.target;
    return before ? target.width > before.width || target.length > before.length : true;
  });
  if (grown && !fitsInStrips(cutList.lines, task)) {
    remarks.push(['Whole strips of the blank do not yield it. Another way of cutting may: try it first.']);
  }
  return remarks;
}
