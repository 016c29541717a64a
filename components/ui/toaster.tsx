'use client';

import { Toaster as Sonner } from 'sonner';

/** Short words on what was just done. `toast` and `toast.error` come from sonner. */
export function Toaster() {
  return (
    <Sonner
      position="bottom-left"
      icons={{ success: null, error: null, info: null, warning: null, loading: null }}
      toastOptions={{
        unstyled: true,
        classNames: {
          toast:
            'flex w-full flex-wrap items-center gap-3 border-outline border-ink bg-sheet p-4 text-ink font-text sm:w-[22rem]',
          title: 'font-[620]',
          description: 'text-label text-ink-2',
          error: '!border-refuse !text-refuse',
          actionButton: 'ml-auto border border-act bg-act px-3 py-1 font-[620] text-on-act',
          cancelButton: 'border border-ink px-3 py-1 font-[620]',
        },
      }}
    />
  );
}
