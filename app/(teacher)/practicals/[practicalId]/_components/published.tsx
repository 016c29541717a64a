'use client';

import type { RefObject } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { LinkButton } from '@/components/ui/link-button';
import type { SittingBehind } from '@/lib/data/practicals/read-practical';
import { SittingsBehind } from './sittings-behind';

/** What can be done next with a version that has just been published. */
export function Published({
  practicalId,
  number,
  behind,
  returnTo,
  onClose,
}: {
  practicalId: string;
  number: number;
  behind: readonly SittingBehind[];
  returnTo: RefObject<HTMLElement | null>;
  onClose(): void;
}) {
  return (
    <Dialog
      open
      returnTo={returnTo}
      onOpenChange={(open) => {
        if (!open) onClose();
      }}
      title={`Version ${number} is published`}
      description="Give it to a section, or try it at the bench first: a practice round keeps nothing."
    >
      {behind.length > 0 ? (
        <div className="mb-4">
          <p>Sittings that are open already keep their version. See first what moving one would do:</p>
          <SittingsBehind sittings={behind} />
        </div>
      ) : null}
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
