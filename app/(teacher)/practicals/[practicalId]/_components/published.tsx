'use client';

import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { LinkButton } from '@/components/ui/link-button';

/** What can be done next with a version that has just been published. */
export function Published({
  practicalId,
  number,
  onClose,
}: {
  practicalId: string;
  number: number;
  onClose(): void;
}) {
  return (
    <Dialog
      open
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={`Version ${number} is published`}
      description="Give it to a section, or try it at the bench first: a practice round keeps nothing."
    >
      <div className="flex flex-wrap gap-2">
        <LinkButton kind="act" href={`/sittings/new?practical=${practicalId}`}>
          open a sitting
        </LinkButton>
        <LinkButton href={`/practicals/${practicalId}/practice`}>practice round</LinkButton>
        <Button kind="quiet" onClick={onClose}>
          stay here
        </Button>
      </div>
    </Dialog>
  );
}
