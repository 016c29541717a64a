'use client';

interface AsAllKeyProps {
  label: string;
  selected: boolean;
  onPress(): void;
}

/** A cell that says nothing of its own; pressing it lays out below what holds for all lines. */
export function AsAllKey({ label, selected, onPress }: AsAllKeyProps) {
  return (
    <button
      type="button"
      aria-pressed={selected}
      aria-label={label}
      onClick={onPress}
      className={
        selected
          ? 'block h-9 w-full scroll-mt-16 border-b-edge border-act bg-plate px-1 text-left text-label text-ink-2'
          : 'block h-9 w-full scroll-mt-16 border-b border-transparent px-1 text-left text-label text-ink-2 hover:border-ink'
      }
    >
      as all
    </button>
  );
}
