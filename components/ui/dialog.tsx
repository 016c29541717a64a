'use client';

import { Dialog as Radix } from 'radix-ui';
import { type ReactNode, type RefObject, useRef } from 'react';
import { Button } from './button';
import { classNames } from './class-names';

export const VEIL = 'fixed inset-0 z-40 bg-[rgb(0_0_0/0.45)]';
export const SHEET =
  'fixed top-1/2 left-1/2 z-50 max-h-[90dvh] w-[calc(100vw-2rem)] max-w-[36rem] -translate-x-1/2 -translate-y-1/2 overflow-y-auto border-outline border-ink bg-sheet p-4 sm:p-6';

interface DialogProps {
  /** What opens it; leave out when `open` is held by the caller. */
  trigger?: ReactNode;
  title: ReactNode;
  description?: ReactNode;
  open?: boolean;
  onOpenChange?: (open: boolean) => void;
  closeLabel?: string;
  /** Where the focus goes when it closes; left out, to what opened it. */
  returnTo?: RefObject<HTMLElement | null>;
  children: ReactNode;
  className?: string;
}

export function Dialog(props: DialogProps) {
  const {
    trigger,
    title,
    description,
    open,
    onOpenChange,
    closeLabel = 'close',
    children,
    returnTo,
    className,
  } = props;
  const openedFrom = useRef<Element | null>(null);
  return (
    <Radix.Root open={open} onOpenChange={onOpenChange}>
      {trigger ? <Radix.Trigger asChild>{trigger}</Radix.Trigger> : null}
      <Radix.Portal>
        <Radix.Overlay className={VEIL} />
        <Radix.Content
          className={classNames(SHEET, className)}
          onOpenAutoFocus={() => {
            openedFrom.current = document.activeElement;
          }}
          onCloseAutoFocus={(event) => {
            if (trigger) return;
            event.preventDefault();
            giveBack(returnTo?.current ?? openedFrom.current);
          }}
          {...(description ? {} : { 'aria-describedby': undefined })}
        >
          <div className="mb-4 flex items-start justify-between gap-4 border-b-edge border-ink pb-2">
            <Radix.Title className="font-title text-[1.5rem] leading-8 font-[620]">{title}</Radix.Title>
            <Radix.Close asChild>
              <Button kind="quiet" size="small">
                {closeLabel}
              </Button>
            </Radix.Close>
          </div>
          {description ? <Radix.Description className="mb-4">{description}</Radix.Description> : null}
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}

/** The focus goes back to what opened the dialog, unless the caller has led it elsewhere. */
function giveBack(opener: Element | null): void {
  const { activeElement, body } = document;
  if (activeElement !== null && activeElement !== body) return;
  if (opener instanceof HTMLElement && opener.isConnected) opener.focus({ preventScroll: true });
}
