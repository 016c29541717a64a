'use client';

import { Popover as Radix } from 'radix-ui';
import type { ReactNode } from 'react';
import { classNames } from './class-names';

interface PopoverProps {
  trigger: ReactNode;
  label: string;
  align?: 'start' | 'center' | 'end';
  children: ReactNode;
  className?: string;
}

/** A slip of paper beside what was pressed. */
export function Popover({ trigger, label, align = 'end', children, className }: PopoverProps) {
  return (
    <Radix.Root>
      <Radix.Trigger asChild>{trigger}</Radix.Trigger>
      <Radix.Portal>
        <Radix.Content
          aria-label={label}
          align={align}
          sideOffset={6}
          collisionPadding={12}
          className={classNames(
            'z-30 max-w-[calc(100vw-1.5rem)] border-outline border-ink bg-sheet p-4',
            className,
          )}
        >
          {children}
        </Radix.Content>
      </Radix.Portal>
    </Radix.Root>
  );
}
