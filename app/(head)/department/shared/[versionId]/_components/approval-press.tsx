'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { Refusal } from '@/components/ui/refusal';
import type { SharedVersionView } from '@/lib/data/department/read-shared-version';
import { approveVersionAction, endApprovalAction } from '../actions';

const NO_ANSWER = 'The server does not answer. Nothing was changed; try again in a moment.';

/** Approves the version as the department's, or ends that; either says first what it means. */
export function ApprovalPress({ view }: { view: SharedVersionView }) {
  const [refused, setRefused] = useState<string | null>(null);
  const { approval, versionId } = view;
  const press = async () => {
    const reply = approval ? endApprovalAction(approval.approvalId) : approveVersionAction(versionId);
    setRefused(await reply.catch(() => NO_ANSWER));
  };
  return (
    <>
      {approval ? (
        <ConfirmDialog
          trigger={<Button>end the approval</Button>}
          title={`End the approval of version ${view.number}?`}
          confirmLabel="end the approval"
          action={press}
        >
          <EndWords view={view} />
        </ConfirmDialog>
      ) : (
        <Approve view={view} press={press} />
      )}
      {refused ? <Refusal title={refused} className="basis-full" /> : null}
    </>
  );
}

function Approve({ view, press }: { view: SharedVersionView; press: () => Promise<void> }) {
  if (!view.offered) {
    return (
      <Button kind="act" notYet="it is not on offer any more">
        approve it
      </Button>
    );
  }
  return (
    <ConfirmDialog
      trigger={<Button kind="act">approve it</Button>}
      title={`Approve version ${view.number} as the department’s?`}
      confirmLabel={`approve version ${view.number}`}
      kind="act"
      action={press}
    >
      <div className="grid gap-3">
        <p>
          Your teachers are told that this is the department’s rubric for “{view.title}”, and can give it to
          their periods. Where their own rubrics differ from it, you read it here, with their reason.
        </p>
        <p>
          <strong>No sitting changes by this.</strong> Each keeps the version it stands under until its
          teacher moves it.
        </p>
        {view.standing.map(({ ownerName, number, title }) => (
          <p key={`${ownerName} ${number} ${title}`}>
            It ends the approval of {ownerName}’s “{title}”, version {number}.
          </p>
        ))}
      </div>
    </ConfirmDialog>
  );
}

function EndWords({ view }: { view: SharedVersionView }) {
  return (
    <p>
      The department then has no rubric of its own for “{view.title}”. Sittings stay as they are, and nothing
      that was published changes.
      {view.offered ? '' : ' As it is not on offer, only its teacher can give it after that.'}
    </p>
  );
}
