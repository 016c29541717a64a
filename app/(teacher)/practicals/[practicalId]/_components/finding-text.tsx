'use client';

import { Button } from '@/components/ui/button';
import { classNames } from '@/components/ui/class-names';
import type { PlacedFinding } from '@/lib/practicals/place-findings';
import { useEditor } from './editor-context';

/** A finding with the press that settles it, where one does. */
export function FindingText({ text, fix, isNote }: PlacedFinding) {
  const { desk } = useEditor();
  return (
    <p className={classNames('max-w-[72ch] text-label', isNote ? 'text-ink-2' : 'font-[520] text-ink')}>
      {text}{' '}
      {fix ? (
        <Button
          kind="quiet"
          size="small"
          className="min-h-6 px-0 py-0 text-left"
          onClick={() => desk.edit((draft) => fix.apply(draft))}
        >
          {fix.label}
        </Button>
      ) : null}
    </p>
  );
}

/** The findings of one field, hung from it by a leader; a note stands quietly. */
export function FindingNotes({ path, className }: { path: string; className?: string }) {
  const { findings } = useEditor();
  const here = findings.filter((finding) => finding.path === path);
  if (here.length === 0) return null;
  const isQuiet = here.every(({ isNote }) => isNote);
  return (
    <div
      className={classNames(
        'grid gap-2',
        !isQuiet && 'relative border-t-edge border-ink pt-2 pl-6',
        className,
      )}
    >
      {isQuiet ? null : (
        <>
          <span aria-hidden className="absolute -top-[5px] left-[5px] size-[7px] rounded-[50%] bg-ink" />
          <span aria-hidden className="absolute top-0 left-2 h-5 w-3 border-b border-l border-ink" />
        </>
      )}
      {here.map((finding) => (
        <FindingText key={finding.code} {...finding} />
      ))}
    </div>
  );
}
