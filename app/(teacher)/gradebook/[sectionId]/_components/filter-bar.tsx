'use client';

import { useId } from 'react';
import { SelectControl } from '@/components/ui/select-control';
import { SHOWN, type Shown } from './cell-words';

interface FilterBarProps {
  text: string;
  onText: (text: string) => void;
  shown: Shown;
  onShown: (shown: Shown) => void;
  found: number;
  of: number;
}

const CONTROL =
  'min-h-8 w-full min-w-0 border-0 border-b border-rule bg-plate px-2 text-label text-ink hover:border-ink';

/** By text and by word. It stands in the empty corner over the names where there is room for it. */
export function FilterBar({ text, onText, shown, onShown, found, of }: FilterBarProps) {
  const id = useId();
  return (
    <div className="mb-2 grid grid-cols-2 gap-1 md:absolute md:top-0 md:left-0 md:z-[3] md:mb-0 md:w-44 md:grid-cols-1 print:hidden">
      <label className="min-w-0">
        <span className="sr-only">find a student by name or ID</span>
        <input
          type="search"
          value={text}
          onChange={(event) => onText(event.target.value)}
          placeholder="find a student"
          className={CONTROL}
        />
      </label>
      <label className="min-w-0" htmlFor={id}>
        <span className="sr-only">show</span>
        <SelectControl
          id={id}
          value={shown}
          onChange={(event) => onShown(SHOWN.find((name) => name === event.target.value) ?? 'everyone')}
          className={CONTROL}
        >
          {SHOWN.map((name) => (
            <option key={name} value={name}>
              {name === 'everyone' ? 'everyone' : `with ${name}`}
            </option>
          ))}
        </SelectControl>
      </label>
      <p role="status" className="sr-only">
        {found} of {of} students shown
      </p>
    </div>
  );
}
