import { sayMoment } from '@/components/ui/days';
import { Notice } from '@/components/ui/notice';
import type { MoveChoices } from '@/lib/contracts/moves';
import { UndoMove } from '../move/_components/undo-move';
import { standingMove } from './moved-words';

/** A move that nothing was published after: what it did, and the way back. */
export function LatestMove({ choices }: { choices: MoveChoices }) {
  const move = standingMove(choices);
  if (!move?.canUndo) return null;
  const { sittingId, timeZone, published } = choices;
  return (
    <div>
      <Notice
        title={`Moved from version ${move.from} to ${move.to}${move.holdHarmless ? ', nobody drops' : ''}.`}
      >
        {move.movedBy}, {sayMoment(move.movedAt, timeZone)}.{' '}
        {published
          ? 'Students whose score changes are told when you publish again; until then you can undo it.'
          : 'You can undo it until you publish.'}
      </Notice>
      <div className="pl-8">
        <UndoMove sittingId={sittingId} move={move} />
      </div>
    </div>
  );
}
