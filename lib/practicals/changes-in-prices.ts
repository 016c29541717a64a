import type { Line, Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { capital, nowWas, rowChanges } from './change-words';
import { changesInChecks, changesInPieceChecks } from './changes-in-checks';
import { lineName } from './changes-in-task';
import { countingRows, redoAndPredictionRows, totalRows, worthRows } from './compare-rows';
import { compareSizes, type MatchedLine } from './compare-sizes';
import type { Compared, ComparedSizes, Phrase } from './compare-types';
import { priceSentences } from './compare-words';

type Written = Omit<Compared, 'label'>;

/** What another version prices, checks, totals or treats otherwise; lines that only one of the two has are left out. */
export function changesInPrices(
  before: Written & { number: number },
  now: Written & { number?: number; called?: string },
): Phrase[] {
  const was = { ...before, label: `version ${before.number}` };
  const is = { ...now, label: now.called ?? `version ${now.number ?? before.number + 1}` };
  const lines = sameLines(before.rubric, now);
  const sizes = compareSizes(lines, [before.rubric.margin, now.rubric.margin]);
  const [lateWas, lateNow] = [before, now].map(({ form }) => lateWords(form.policies.late));
  return [
    ...priceSentences(sizes, [was.label, is.label]).map(capital),
    ...sizes.filter(isOnlyWritingOther).map(({ name }): Phrase => {
      return ['Bands of ', ...name, ': divided otherwise, at the same prices.'];
    }),
    ...rowChanges(worthRows(lines)),
    ...changesInPieceChecks(lines),
    ...rowChanges(countingRows(lines)),
    ...changesInChecks(before.rubric.workChecks, now.rubric.workChecks, 'of the whole work'),
    ...rowChanges(totalRows([was, is])),
    ...(lateWas === lateNow ? [] : [nowWas('late work', lateNow ?? '', lateWas ?? '')]),
    ...rowChanges(redoAndPredictionRows([was, is])),
  ];
}

/** The sizes on which two versions of a practical part, with both prices, for a drawing of them. */
export function changedSizes(before: Rubric, now: Pick<Written, 'task' | 'rubric'>): ComparedSizes[] {
  const sizes = compareSizes(sameLines(before, now), [before.margin, now.rubric.margin]);
  return sizes.filter(({ spans }) => spans.length > 0);
}

function lateWords(late: RubricForm['policies']['late']): string {
  return late ? `${late.perDay}% a day, ${late.max}% at most` : 'no loss';
}

/**
 * Each line of now with the one it was before: by id; one that was taken out and written anew is known by its name, else
 * by its pieces, so that its price can be set against the old one.
 */
function sameLines(before: Rubric, now: Pick<Written, 'task' | 'rubric'>): MatchedLine[] {
  const left = [...before.lines];
  const take = (line: Line, isSame: (old: Line) => boolean): MatchedLine[] => {
    const index = left.findIndex(isSame);
    const [old] = index < 0 ? [] : left.splice(index, 1);
    const label = lineName(line, now.task.cutList.lines);
    return old ? [[{ ...old, label }, line]] : [];
  };
  const byId = now.rubric.lines.map((line) => ({ line, found: take(line, ({ id }) => id === line.id) }));
  const rest = byId.map(({ line, found }) => ({
    line,
    found: found.length > 0 ? found : take(line, ({ label }) => label === line.label),
  }));
  return rest.flatMap(({ line, found }) =>
    found.length > 0
      ? found
      : take(line, ({ target }) => JSON.stringify(target) === JSON.stringify(line.target)),
  );
}

/** Bands of another division or a cap above every price: no deviation costs otherwise, yet the list reads otherwise. */
function isOnlyWritingOther({ prices }: ComparedSizes): boolean {
  const [first, ...others] = prices.map(({ rule }) => ruleText(rule));
  if (others.every((text) => text === first)) return false;
  return priceSentences([groupOf(prices)], ['', '']).length === 0;
}

function groupOf(prices: ComparedSizes['prices']): ComparedSizes {
  return { name: [], sizes: [], prices, spans: [], rows: [] };
}

function ruleText({ over, under, beyondOver, beyondUnder, cap }: Line['sizes']['length']): string {
  const side = (bands: Line['sizes']['length']['over']) => bands.map(({ within, lose }) => [within, lose]);
  return JSON.stringify([side(over), beyondOver, side(under), beyondUnder, cap]);
}
