'use client';

import { classNames } from '@/components/ui/class-names';
import { PhraseText } from '@/components/ui/phrase-text';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import { type ExampleAttempt, exampleAttempts, scoreExample } from '@/lib/practicals/example-attempts';
import { scoreAttempt } from '@/lib/scoring';
import { type Editor, useEditor } from './editor-context';

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
  const examples = exampleAttempts(rubric, about);
  const scored = examples.map((example) => ({
    example,
    draft: scoreExample(rubric, example),
    before: latest ? scoreExample(latest, example) : null,
  }));
  return (
    <>
      <Scale rubric={rubric} example={examples[0]} />
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
              <th scope="row" className="py-2 pr-2 text-label font-[440]">
                <PhraseText phrase={example.label} unit={rubric.unit} />
              </th>
              {latest ? <td className="px-2 py-2 text-right">{scoreText(before)}</td> : null}
              <td
                className={classNames(
                  'py-2 text-right text-heading',
                  latest && before !== draft && 'text-act',
                )}
              >
                {scoreText(draft)}
              </td>
            </tr>
          ))}
        </tbody>
      </table>
      <LeavingOut scored={scored} />
    </>
  );
}

function scoreText(points: number | null): string {
  return points === null ? '–' : pointsAsText(points);
}

/** "of 100. 1 of 63 is 1.59 of 100." */
function Scale({
  rubric,
  example,
}: {
  rubric: ExamplesProps['rubric'];
  example: ExampleAttempt | undefined;
}) {
  if (!example) return null;
  const { possible, total } = scoreAttempt(rubric, example.attempt);
  const one = Math.round((100 * total) / Math.max(1, possible));
  return (
    <p className="text-label text-ink-2">
      of {pointsAsText(total)}.{' '}
      {possible === total
        ? 'A point is a point of the total.'
        : `1 of ${pointsAsText(possible)} is ${pointsAsText(one)} of ${pointsAsText(total)}.`}
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
