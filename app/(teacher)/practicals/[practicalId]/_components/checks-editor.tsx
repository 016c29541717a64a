'use client';

import { Button } from '@/components/ui/button';
import { Heading } from '@/components/ui/titles';
import { checksEffect } from '@/lib/practicals/rule-effects';
import { ChecksFields } from './checks-fields';
import { lineOf, useEditor } from './editor-context';

/** The checks of each piece: of all lines, or of one that is checked otherwise. */
export function ChecksEditor({ lineId }: { lineId: string | null }) {
  const { desk } = useEditor();
  const { draft } = desk;
  const found = lineOf(draft.lines, lineId);
  const own = found ? found.line.checks : draft.all.checks;
  const name = found ? found.line.label || `line ${found.index + 1}` : 'all lines';
  const exampleId = lineId ?? draft.lines.find(({ checks }) => checks === null)?.id ?? null;
  const setOwn = (isOwn: boolean) =>
    desk.edit((next) => {
      const line = lineOf(next.lines, lineId)?.line;
      if (line) line.checks = isOwn ? structuredClone(next.all.checks) : null;
    });
  return (
    <section aria-labelledby="checks-heading" className="mt-8">
      <div className="mb-4 flex flex-wrap items-center gap-x-4 gap-y-1">
        <Heading id="checks-heading" className="text-[1.4375rem] leading-7 font-[660] first-letter:uppercase">
          {name}, checks of a piece
        </Heading>
        {found ? (
          <p className="text-label text-ink-2">
            {own ? 'differs from all lines' : 'checked as all lines'}{' '}
            <Button kind="quiet" size="small" className="px-2" onClick={() => setOwn(!own)}>
              {own ? 'check as all lines' : 'check it by itself'}
            </Button>
          </p>
        ) : null}
      </div>
      <p className="mb-4 max-w-[62ch] text-label text-ink-2">
        What a rule cannot read. A fault loses its points beside the sizes; a piece never loses more than it
        is worth.
      </p>
      <ChecksWorst lineId={exampleId} />
      {own ? (
        <ChecksFields
          base={found ? `lines.${found.index}.checks` : 'all.checks'}
          checks={own}
          listIn={(next) => (found ? (lineOf(next.lines, lineId)?.line.checks ?? null) : next.all.checks)}
          emptyText="Nothing but sizes counts. Add a check for what a rule cannot read, such as square or surface."
        />
      ) : null}
    </section>
  );
}

/** What a piece loses that fails every check at its dearest. */
function ChecksWorst({ lineId }: { lineId: string | null }) {
  const { parsed } = useEditor();
  const phrase = parsed.ok && lineId !== null ? checksEffect(parsed.rubric, lineId) : '';
  if (phrase === '') return null;
  return <p className="mb-4 max-w-[62ch] text-label font-[560] first-letter:uppercase">{phrase}</p>;
}
