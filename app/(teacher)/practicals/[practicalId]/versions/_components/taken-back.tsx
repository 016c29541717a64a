import Link from 'next/link';
import { Button } from '@/components/ui/button';
import { Refusal } from '@/components/ui/refusal';

interface TakenBackProps {
  practicalId: string;
  number: number;
  pending: boolean;
  refused: string | null;
  onUndo: () => void;
}

/** Said once a version was taken back, with the way back from it. */
export function TakenBack({ practicalId, number, pending, refused, onUndo }: TakenBackProps) {
  return (
    <div role="status" className="flex w-0 min-w-full flex-wrap items-center gap-x-3 gap-y-2 text-label">
      <span>
        <Link className="link" href={`/practicals/${practicalId}`}>
          Your draft
        </Link>{' '}
        says what version {number} says.
      </span>
      <Button size="small" onClick={onUndo} disabled={pending} aria-busy={pending}>
        undo
      </Button>
      {refused ? <Refusal title={refused} /> : null}
    </div>
  );
}
