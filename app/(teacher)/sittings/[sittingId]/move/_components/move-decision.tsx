'use client';

import { Button } from '@/components/ui/button';
import { ChoiceGroup, RadioField } from '@/components/ui/choice';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import type { MovePreview } from '@/lib/contracts/moves';
import { count } from '../../../../_components/names';
import { choiceWords, countTold, whoMoves } from './move-words';

interface MoveDecisionProps {
  preview: MovePreview;
  published: boolean;
  /** Null until somebody has said whether anybody may drop. */
  held: boolean | null;
  onHeld: (held: boolean) => void;
  onMove: (held: boolean) => Promise<void>;
}

/** Whether anybody may drop, and the one press that moves the sitting. */
export function MoveDecision({ preview, published, held, onHeld, onMove }: MoveDecisionProps) {
  const { from, to } = preview;
  const words = choiceWords(preview);
  const moveLabel = `move to version ${to.number}`;
  return (
    <section aria-label="the move" className="grid gap-4">
      <ChoiceGroup legend={<span className="text-heading text-ink">May anybody drop?</span>}>
        <RadioField
          name="held"
          value="no"
          checked={held === false}
          onChange={() => onHeld(false)}
          label="as it is"
          hint={words.asIs}
        />
        <RadioField
          name="held"
          value="yes"
          checked={held === true}
          onChange={() => onHeld(true)}
          label="nobody drops"
          hint={words.held}
        />
      </ChoiceGroup>
      <p className="max-w-[48ch] text-label text-ink-2">
        <Told preview={preview} published={published} held={held ?? false} />
      </p>
      {held === null ? (
        <div>
          <Button kind="act" notYet="choose first whether anybody may drop">
            {moveLabel}
          </Button>
        </div>
      ) : (
        <div>
          <ConfirmDialog
            trigger={<Button kind="act">{moveLabel}</Button>}
            title={`Move this sitting to version ${to.number}?`}
            confirmLabel={moveLabel}
            kind="act"
            action={() => onMove(held)}
          >
            <p>
              {sentence(preview, held)} No reading is touched: what was read is priced by version {to.number}{' '}
              instead of version {from.number}, at the bench too.
            </p>
            <p className="mt-2">
              <Told preview={preview} published={published} held={held} /> You can undo the move until you
              publish
              {published ? ' again' : ''}.
            </p>
          </ConfirmDialog>
        </div>
      )}
    </section>
  );
}

function sentence(preview: MovePreview, held: boolean): string {
  const { counts } = whoMoves(preview);
  if (preview.gain + preview.same + preview.lose === 0) return 'Nothing can be compared yet.';
  if (!held || preview.lose === 0) return `${counts}.`;
  const { gain, lose } = preview;
  return `Nobody drops: ${count(lose, 'score is', 'scores are')} held${gain > 0 ? ` and ${count(gain, 'gains', 'gain')}` : ''}.`;
}

interface ToldProps {
  preview: MovePreview;
  published: boolean;
  held: boolean;
}

/** Who hears of it, and when. */
function Told({ preview: { students }, published, held }: ToldProps) {
  if (!published) return 'Nothing is out yet: students hear nothing before you publish.';
  const told = countTold(students, held);
  if (told === 0) return 'No score that is out changes, so nobody is told anything.';
  const out = students.filter((student) => student.told).length;
  return `Students are told at the next publication, and only those whose score changes: ${told} of ${out}.`;
}
