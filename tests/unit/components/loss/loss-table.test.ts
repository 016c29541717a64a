import { createElement } from 'react';
import { renderToStaticMarkup } from 'react-dom/server';
import { expect, test } from 'vitest';
import { LossTable } from '@/components/loss/loss-table';
import { explainScore } from '@/lib/practicals/explain-score';
import { scoreAttempt } from '@/lib/scoring';
import { modifyAttempt, modifyRubric } from '@/lib/scoring/modification';
import { deriveAttempt } from '@/lib/sync/derive';
import { readAll } from '@/tests/support/own-readings';
import { defaultRubric, ticksOf } from '@/tests/support/rubrics';

const ROWS: [string, number, string][] = [
  ['base', 1, '1/2 x 3 1/2 x 7'],
  ['end', 2, '1/2 x 3 1/2 x 4'],
];
const LEFT_OUT = {
  format: 1 as const,
  widen: { num: 1, den: 1 },
  excused: [{ lineId: 'end', axis: null }],
  checks: [],
};

function tableOf(isLeftOut: boolean): string {
  const published = { ...defaultRubric(ROWS), outOf: null };
  const { attempt } = deriveAttempt(readAll(published, { 'base 1 length': -ticksOf('1/16') }), 'own');
  const rubric = isLeftOut ? modifyRubric(published, LEFT_OUT) : published;
  const counted = isLeftOut ? modifyAttempt(published, attempt, LEFT_OUT) : attempt;
  const explanation = explainScore(rubric, scoreAttempt(rubric, counted), 0);
  return renderToStaticMarkup(createElement(LossTable, { rubric, explanation, heading: 'Every lost point' }));
}

const figuresOf = (table: string) => [...table.matchAll(/>(\d+(?:\.\d+)?)</g)].map(([, figure]) => figure);

test('where points and total are one scale a loss is told once', () => {
  const table = tableOf(false);
  expect(table).not.toContain('>of 27<');
  // The row, lost, kept and score.
  expect(figuresOf(table).slice(-4)).toEqual(['1', '1', '26', '26']);
});

test('where what counts is worth less than the total each loss is told on both scales, and both add up', () => {
  const table = tableOf(true);
  expect(table).toContain('>of 27<');
  expect(figuresOf(table).slice(-7)).toEqual(['1', '3', '1', '3', '8', '24', '24']);
});
