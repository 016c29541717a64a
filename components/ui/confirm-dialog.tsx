'use client';

import { AlertDialog } from 'radix-ui';
import { type ReactNode, useState, useTransition } from 'react';
import { Button } from './button';
import { SHEET, VEIL } from './dialog';

interface ConfirmDialogProps {
  trigger: ReactNode;
  /** The act as a question: "Withdraw version 3?" */
  title: ReactNode;
  /** What will be lost, and what stays. */
  children: ReactNode;
  confirmLabel: string;
  cancelLabel?: string;
  /** `refuse` for what destroys, `act` for what only cannot be taken back easily. */
  kind?: 'refuse' | 'act';
  /** Called with the given fields as form data, so that a server action fits as it is. */
  action: (data: FormData) => unknown;
  fields?: Record<string, string>;
}

export function ConfirmDialog(props: ConfirmDialogProps) {
  const { trigger, title, children, confirmLabel, cancelLabel = 'leave it', kind = 'refuse', action } = props;
  const [open, setOpen] = useState(false);
  const [pending, startTransition] = useTransition();

  function confirm() {
    const data = new FormData();
    for (const [name, value] of Object.entries(props.fields ?? {})) data.set(name, value);
    startTransition(async () => {
      await action(data);
      setOpen(false);
    });
  }

  return (
    <AlertDialog.Root open={open} onOpenChange={setOpen}>
      <AlertDialog.Trigger asChild>{trigger}</AlertDialog.Trigger>
      <AlertDialog.Portal>
        <AlertDialog.Overlay className={VEIL} />
        <AlertDialog.Content className={SHEET}>
          <AlertDialog.Title className="mb-2 text-heading">{title}</AlertDialog.Title>
          <AlertDialog.Description asChild>
            <div className="mb-6">{children}</div>
          </AlertDialog.Description>
          <div className="flex flex-wrap justify-end gap-2">
            <AlertDialog.Cancel asChild>
              <Button>{cancelLabel}</Button>
            </AlertDialog.Cancel>
            <Button kind={kind} onClick={confirm} disabled={pending} aria-busy={pending}>
              {confirmLabel}
            </Button>
          </div>
        </AlertDialog.Content>
      </AlertDialog.Portal>
    </AlertDialog.Root>
  );
}
