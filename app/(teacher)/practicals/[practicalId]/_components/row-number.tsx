'use client';

import { classNames } from '@/components/ui/class-names';
import { fieldId } from './editor-context';
import type { SheetKeys } from './sheet-keys';
import type { RowDragger } from './use-row-drag';

interface RowNumberProps {
  index: number;
  name: string;
  inHand: boolean;
  selected: boolean;
  keys: SheetKeys;
  dragger: RowDragger;
  onOpen(): void;
}

/** The number at the head of a row: the row is dragged by it, moved with Alt, and opened with a press. */
export function RowNumber({ index, name, inHand, selected, keys, dragger, onOpen }: RowNumberProps) {
  return (
    <button
      id={fieldId(`lines.${index}.number`)}
      type="button"
      aria-pressed={selected}
      aria-label={`line ${index + 1}, ${name}: how its pieces are read`}
      aria-describedby="sheet-keys"
      onClick={() => {
        if (!dragger.takesClick()) onOpen();
      }}
      onFocus={() => keys.onFocus(index, 'number', '')}
      onKeyDown={(event) => keys.onKeyDown(event, index, 'number')}
      onPaste={(event) => keys.onPaste(event, index, 'number')}
      onPointerDown={(event) => dragger.onPointerDown(event, index)}
      onPointerMove={(event) => dragger.onPointerMove(event)}
      onPointerUp={(event) => dragger.onPointerUp(event)}
      onPointerCancel={() => dragger.onPointerCancel()}
      className={classNames(
        'group/number tnum flex h-9 w-full cursor-grab scroll-mt-16 touch-none items-center gap-1.5 border-b border-transparent text-left text-ink-2 select-none hover:border-ink hover:text-ink active:cursor-grabbing',
        inHand && 'font-[660] text-ink',
        selected && 'border-b-edge border-act text-ink',
      )}
    >
      <svg
        aria-hidden
        viewBox="0 0 8 13"
        className="h-[13px] w-2 shrink-0 stroke-rule group-hover/number:stroke-ink group-focus-visible/number:stroke-ink"
      >
        <path d="M0 1.5H8M0 4.8H4M0 8.1H6M0 11.4H4" className="[stroke-width:1.4]" />
      </svg>
      {index + 1}
    </button>
  );
}
