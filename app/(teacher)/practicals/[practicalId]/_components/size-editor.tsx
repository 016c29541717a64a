'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { CheckboxField } from '@/components/ui/choice';
import { LengthText } from '@/components/ui/fraction';
import { pointsAsText } from '@/components/ui/points-text';
import { Heading } from '@/components/ui/titles';
import { readSizeRule } from '@/lib/practicals/parse-size-rule';
import { ON_TARGET, type TriedPiece, tryPiece } from '@/lib/practicals/try-piece';
import type { Axis, SizeRule } from '@/lib/scoring';
import { BandFields } from './band-fields';
import { lineOf, useEditor } from './editor-context';
import { FindingNotes } from './finding-text';
import { InstrumentNote } from './instrument-note';
import { PresetKeys } from './preset-keys';
import { OFF, PriceOnRule } from './price-on-rule';
import { exampleLineOf, readSize, targetOf } from './read-draft';
import { TriedSentence } from './tried-sentence';
import { TryPiece } from './try-piece';
import { type SizeRuleDesk, useSizeRule } from './use-size-rule';

interface SizeEditorProps {
  lineId: string | null;
  axis: Axis;
  /** What was tried of each line so far. */
  tried: Readonly<Record<string, TriedPiece>>;
  onTry(lineId: string, piece: TriedPiece): void;
}

/** The price of one size on its rule: what is typed or drawn stands on it at once, and a reading can be tried. */
export function SizeEditor({ lineId, axis, tried, onTry }: SizeEditorProps) {
  const { desk, unit } = useEditor();
  const size = useSizeRule(lineId, axis);
  const found = lineOf(desk.draft.lines, lineId);
  const name = found ? found.line.label || `line ${found.index + 1}` : 'all lines';
  const ofLine = found ? readSize(found.line[axis], unit) : null;
  const target = targetOf(desk.draft, lineId, axis);
  const read = readSizeRule(size.rule, unit);
  const drawn = useLastRead(read);
  const trial = useTrial(exampleLineOf(desk.draft, lineId, axis)?.id ?? null, axis, tried, onTry);
  return (
    <section aria-labelledby="size-heading" className="mt-8">
      <div className="mb-3 flex flex-wrap items-center gap-x-4 gap-y-2">
        <Heading id="size-heading" className="text-[1.4375rem] leading-7 font-[660] first-letter:uppercase">
          {name}, {size.together ? 'every size' : axis}{' '}
          {ofLine === null ? null : <LengthText ticks={ofLine} unit={unit} />}
        </Heading>
        {lineId === null ? (
          <CheckboxField
            label="thickness, width and length alike"
            className="text-label"
            checked={size.together}
            onChange={(event) => size.setTogether(event.target.checked)}
          />
        ) : (
          <Owner size={size} />
        )}
        {size.isOwn ? <PresetKeys {...{ size, read, target }} /> : null}
      </div>
      {drawn ? (
        <PriceOnRule
          rule={drawn}
          name={`${name}, ${axis}`}
          reading={trial?.reading ?? null}
          {...{ size, axis, target }}
        />
      ) : (
        <p className="border-y border-hair py-6 text-ink-2">
          The rule is drawn as soon as every band below can be read.
        </p>
      )}
      {drawn && !read ? (
        <p className="mt-1 text-label text-ink-2">
          The rule shows the last price that could be read. Mend the field below that is marked.
        </p>
      ) : null}
      <FindingNotes path={size.base} className="mt-3" />
      <div className="mt-6 grid items-start gap-x-10 gap-y-8 lg:grid-cols-[minmax(0,1fr)_minmax(0,1fr)]">
        <BandFields size={size} axis={axis} off={OFF[axis]} read={read} />
        <div className="grid min-w-0 content-start gap-8">
          {trial ? <TryPiece {...trial.panel} axis={axis} /> : <NotTried lineId={lineId} />}
          <InstrumentNote />
        </div>
      </div>
    </section>
  );
}

/** The last price that could be read stays on the rule while a figure of it is being typed. */
function useLastRead(read: SizeRule | null): SizeRule | null {
  const [last, setLast] = useState(read);
  if (read && JSON.stringify(read) !== JSON.stringify(last)) setLast(read);
  return read ?? last;
}

/** One piece of a line priced by the engine as it would be read, and what moves the reading on this axis. */
function useTrial(
  lineId: string | null,
  axis: Axis,
  tried: SizeEditorProps['tried'],
  onTry: SizeEditorProps['onTry'],
) {
  const { parsed } = useEditor();
  const line = parsed.ok && lineId !== null ? parsed.rubric.lines.find(({ id }) => id === lineId) : null;
  if (!parsed.ok || !line) return null;
  const piece = tried[line.id] ?? ON_TARGET;
  const result = tryPiece(parsed.rubric, line.id, piece);
  if (!result) return null;
  const onMove = (deviation: number) =>
    onTry(line.id, { ...piece, deviations: { ...piece.deviations, [axis]: deviation } });
  return {
    reading: {
      deviation: piece.deviations[axis],
      price: `loses ${pointsAsText(result.piece.sizes?.[axis].lose ?? 0)}`,
      said: <TriedSentence {...{ rubric: parsed.rubric, line, axis, result }} />,
      onMove,
    },
    panel: {
      rubric: parsed.rubric,
      line,
      tried: piece,
      result,
      onChange: (next: TriedPiece) => onTry(line.id, next),
    },
  };
}

/** Why no reading can be tried now. */
function NotTried({ lineId }: { lineId: string | null }) {
  const { parsed, desk } = useEditor();
  const text = !parsed.ok
    ? 'A reading can be tried on the rule as soon as every field can be read.'
    : lineId === null && desk.draft.lines.length > 0
      ? 'Every line has a price of its own for this size, so this one is used by none.'
      : 'A reading can be tried on the rule as soon as the cut list has a line.';
  return <p className="text-label text-ink-2">{text}</p>;
}

function Owner({ size }: { size: SizeRuleDesk }) {
  return size.isOwn ? (
    <p className="text-label text-ink-2">
      differs from all lines{' '}
      <Button kind="quiet" size="small" className="px-2" onClick={size.makeAsAll}>
        price as all lines
      </Button>
    </p>
  ) : (
    <p className="text-label text-ink-2">
      priced as all lines{' '}
      <Button kind="quiet" size="small" className="px-2" onClick={size.makeOwn}>
        price it by itself
      </Button>
    </p>
  );
}
