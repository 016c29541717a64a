'use client';

import { useState } from 'react';
import { classNames } from '@/components/ui/class-names';
import { PhraseText } from '@/components/ui/phrase-text';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import { isOneScale, pointsOfTotal, possiblePoints, totalPoints } from '@/lib/practicals/both-scales';
import { type ExampleAttempt, exampleAttempts, scoreExample } from '@/lib/practicals/example-attempts';
import { explainScore } from '@/lib/practicals/explain-score';
import { scoreAttempt } from '@/lib/scoring';
import { type Editor, useEditor } from './editor-context';
import { ExampleDialog } from './example-dialog';

/** Example attempts under the draft, priced as it is typed, beside the version before it. */
export function WhatItGives() {
  const { parsed, latest, selection } = useEditor();
  return (
    <section aria-labelledby="gives-heading">
      <Heading id="gives-heading" className="text-[1.4375rem] leading-7 font-[660]">
        What it gives
      </Heading>
      {parsed.ok ? (
        <Examples
          rubric={parsed.rubric}
          latest={latest?.rubric ?? null}
          {...{ selection }}
          number={latest?.number}
        />
      ) : (
        <p className="mt-2 text-ink-2">
          Examples are priced here as soon as every field can be read.{' '}
          {Object.keys(parsed.errors).length === 1 ? 'One is' : `${Object.keys(parsed.errors).length} are`}{' '}
          not yet.
        </p>
      )}
    </section>
  );
}

interface ExamplesProps {
  rubric: Extract<Editor['parsed'], { ok: true }>['rubric'];
  latest: ExamplesProps['rubric'] | null;
  number?: number;
  selection: Editor['selection'];
}

function Examples({ rubric, latest, number, selection }: ExamplesProps) {
  const about =
    selection.kind === 'size' && selection.lineId !== null
      ? { lineId: selection.lineId, axis: selection.axis }
      : undefined;
  const [opened, setOpened] = useState<ExampleAttempt['id'] | null>(null);
  const open = (example: ExampleAttempt | null) => setOpened(example?.id ?? null);
  const examples = exampleAttempts(rubric, about);
  const scored = examples.map((example) => ({
    example,
    draft: scoreExample(rubric, example),
    before: latest ? scoreExample(latest, example) : null,
  }));
  return (
    <>
      <Scale rubric={rubric} />
      <table className="tnum mt-2 w-full border-b-outline border-ink text-left">
        <caption className="sr-only">scores of example attempts</caption>
        <thead className="border-y border-ink">
          <tr className="text-small text-ink-2">
            <th scope="col" className="py-1.5 pr-2 font-[480]">
              attempt
            </th>
            {latest ? (
              <th scope="col" className="px-2 py-1.5 text-right font-[480] whitespace-nowrap">
                version {number}
              </th>
            ) : null}
            <th scope="col" className="py-1.5 text-right font-[480]">
              {latest ? 'draft' : 'score'}
            </th>
          </tr>
        </thead>
        <tbody className="[&>tr]:border-b [&>tr]:border-hair">
          {scored.map(({ example, draft, before }) => (
            <tr key={example.id}>
              <th scope="row" className="py-1 pr-2 text-label font-[440]">
                <button
                  type="button"
                  aria-haspopup="dialog"
                  onClick={() => open(example)}
                  className="min-h-8 py-1 text-left underline decoration-rule decoration-1 underline-offset-4 hover:decoration-ink"
                >
                  <PhraseText phrase={example.label} unit={rubric.unit} />
                </button>
                <Kept rubric={rubric} example={example} />
              </th>
              {latest ? (
                <td className="px-2 py-2 text-right align-top leading-7">{scoreText(before)}</td>
              ) : null}
              <td
                className={classNames(
                  'py-2 text-right align-top text-heading',
                  latest && before !== draft && 'text-act',
                )}
              >
                {scoreText(draft)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <p className="mt-1 text-small text-ink-2">Press one to see where its points go.</p>
      <LeavingOut scored={scored} />
      <ExampleDialog
        rubric={rubric}
        example={scored.find(({ example }) => example.id === opened)?.example ?? null}
        onClose={() => open(null)}
      />
    </>
  );
}

function scoreText(points: number | null): string {
  return points === null ? '–' : pointsAsText(points);
}

/** "keeps 56 of 63, 88.89 of 100": what the score comes from before it is rounded. */
function Kept({ rubric, example }: { rubric: ExamplesProps['rubric']; example: ExampleAttempt }) {
  if (isOneScale(rubric)) return null;
  const { kept, possible, total } = explainScore(rubric, scoreAttempt(rubric, example.attempt), 0);
  return (
    <span className="block text-small text-ink-2">
      keeps {pointsAsText(kept.points)} of {pointsAsText(possible)}, {pointsAsText(kept.ofTotal)} of{' '}
      {pointsAsText(total)}
    </span>
  );
}

/** "of 100. 1 of 63 is 1.59 of 100." */
function Scale({ rubric }: { rubric: ExamplesProps['rubric'] }) {
  const total = pointsAsText(totalPoints(rubric));
  return (
    <p className="text-label text-ink-2">
      of {total}.{' '}
      {isOneScale(rubric)
        ? 'A point is a point of the total.'
        : `1 of ${pointsAsText(possiblePoints(rubric))} is ${pointsAsText(pointsOfTotal(rubric, 100))} of ${total}.`}
    </p>
  );
}

/** Says so when leaving a piece out gives more than cutting it badly. */
function LeavingOut({ scored }: { scored: readonly { example: ExampleAttempt; draft: number | null }[] }) {
  const missing = scored.find(({ example }) => example.id === 'missing')?.draft ?? null;
  const gross = scored.find(({ example }) => example.id === 'gross')?.draft ?? null;
  if (missing === null || gross === null || missing <= gross) return null;
  return (
    <p className="mt-2 text-label">
      Leaving a piece out gives {pointsAsText(missing)}, cutting it badly {pointsAsText(gross)}.
    </p>
  );
}
