'use client';

import { useSearchParams } from 'next/navigation';
import { classNames } from '@/components/ui/class-names';
import { type EditorStep, stepOfPath } from '@/lib/practicals/field-names';
import { type Editor, useEditor } from './editor-context';

const STEPS: { step: EditorStep; label: string }[] = [
  { step: 'task', label: 'task' },
  { step: 'prices', label: 'cut list and prices' },
  { step: 'rules', label: 'total and rules' },
];

/** The sheet of the editor that lies on top; its address can be kept and shared. */
export function useStep(): [EditorStep, (step: EditorStep) => void] {
  const asked = useSearchParams().get('step');
  const step = STEPS.find((each) => each.step === asked)?.step ?? 'prices';
  return [step, (next) => window.history.pushState(null, '', `?step=${next}`)];
}

interface StepsProps {
  current: EditorStep;
  /** Fields shown as wrong, by sheet. */
  wrong: Record<EditorStep, number>;
  onStep(step: EditorStep): void;
}

export function Steps({ current, wrong, onStep }: StepsProps) {
  const { findings } = useEditor();
  const found = countFound(findings);
  return (
    <nav aria-label="sheets of this practical">
      <ol className="flex flex-wrap gap-x-4 gap-y-1">
        {STEPS.map(({ step, label }, index) => (
          <li key={step}>
            <a
              href={`?step=${step}`}
              aria-current={step === current ? 'step' : undefined}
              onClick={(event) => {
                event.preventDefault();
                onStep(step);
              }}
              className={classNames(
                'inline-flex min-h-11 items-center gap-2 border-b border-rule px-1 pt-1 hover:border-ink',
                step === current && 'border-b-[4px] border-act font-[660] hover:border-act',
              )}
            >
              <span className="tnum text-ink-2">{index + 1}</span>
              {label}
              {wrong[step] > 0 ? (
                <span className="text-label font-[640] text-refuse">{wrong[step]} to mend</span>
              ) : null}
              {wrong[step] === 0 && found[step] > 0 ? (
                <span className="text-label font-[560]">
                  <span
                    aria-hidden
                    className="mr-1 inline-block size-[7px] rounded-[50%] bg-ink align-middle"
                  />
                  {found[step]} to look at
                </span>
              ) : null}
            </a>
          </li>
        ))}
      </ol>
    </nav>
  );
}

/** What is worth looking at on each sheet; the same of several sizes counts once. */
function countFound(findings: Editor['findings']): Record<EditorStep, number> {
  const found: Record<EditorStep, Set<string>> = { task: new Set(), prices: new Set(), rules: new Set() };
  for (const { path, code, text, isNote } of findings) {
    if (!isNote) found[stepOfPath(path)].add(`${code} ${text}`);
  }
  return { task: found.task.size, prices: found.prices.size, rules: found.rules.size };
}
