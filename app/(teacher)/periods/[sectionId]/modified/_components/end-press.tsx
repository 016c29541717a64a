'use client';

import { toast } from 'sonner';
import { Button } from '@/components/ui/button';
import { ConfirmDialog } from '@/components/ui/confirm-dialog';
import { endAccommodationAction } from '../actions';

export function EndPress({ accommodationId, name }: { accommodationId: string; name: string }) {
  return (
    <ConfirmDialog
      trigger={
        <Button size="small">
          end<span className="sr-only"> for {name}</span>
        </Button>
      }
      title={`End the modified rubric of ${name}?`}
      confirmLabel="end it"
      kind="act"
      fields={{ accommodationId }}
      action={async (data) => {
        const refused = await endAccommodationAction(data);
        if (refused) toast.error(refused);
      }}
    >
      From now on the work is priced as everybody’s, what is recorded already too. Results that are out stay
      as they are until you publish again. It stays in the list as ended, with its reason.
    </ConfirmDialog>
  );
}
