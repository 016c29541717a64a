import { sayMoment } from '@/components/ui/days';
import { Heading } from '@/components/ui/titles';
import type { MoveChoices, MoveMade } from '@/lib/contracts/moves';
import { UndoMove } from './undo-move';

/** Every move of this sitting, the latest first, with those that were taken back. */
export function MoveHistory({ choices: { sittingId, moves, version, timeZone } }: { choices: MoveChoices }) {
  return (
    <section>
      <Heading className="border-b-outline border-ink pb-1">Moves of this sitting</Heading>
      {moves.length === 0 ? (
        <p className="py-2 text-label text-ink-2">None: it was opened with version {version.number}.</p>
      ) : (
        <ol>
          {moves.map((move) => (
            <li key={move.moveId} className="border-b border-hair py-2 text-label">
              <Move move={move} timeZone={timeZone} />
              {move.canUndo ? <UndoMove sittingId={sittingId} move={move} /> : null}
            </li>
          ))}
        </ol>
      )}
    </section>
  );
}

function Move({ move, timeZone }: { move: MoveMade; timeZone: string }) {
  const { from, to, holdHarmless, movedBy, movedAt, undone } = move;
  return (
    <>
      <p className={undone ? 'text-ink-2' : 'font-[620]'}>
        version {from} to {to}, {holdHarmless ? 'nobody drops' : 'as it is'}
      </p>
      <p className="text-ink-2">
        {movedBy}, {sayMoment(movedAt, timeZone)}
      </p>
      {undone ? (
        <p>
          undone by {undone.by}, {sayMoment(undone.at, timeZone)}
        </p>
      ) : null}
    </>
  );
}
