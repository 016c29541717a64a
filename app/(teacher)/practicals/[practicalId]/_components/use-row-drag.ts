'use client';

import { type PointerEvent, type RefObject, useEffect, useState } from 'react';
import { nameOf, type SheetDesk } from './sheet-desk';

/** A line on its way: where it stood, where it would stand, and where on the sheet the drop line is drawn. */
export interface RowDrag {
  from: number;
  to: number;
  top: number;
}

/** A press becomes a drag past this many px, so that a shaking hand still presses. */
const SLACK = 5;
/** This near to the window's edge the list is drawn along. */
const EDGE = 56;
const STEP = 14;

interface Hand {
  row: number;
  pointerId: number;
  startY: number;
  y: number;
  moving: boolean;
}

/** Where the row would stand, from the middles of the rows as they lie now. */
function placeAt(section: HTMLElement, from: number, y: number): RowDrag {
  const rows = [...section.querySelectorAll<HTMLElement>('tr[data-line]')].map((row) => {
    const next = row.nextElementSibling;
    const rect = row.getBoundingClientRect();
    const foot = next && !next.matches('[data-line]') ? next.getBoundingClientRect().bottom : rect.bottom;
    return { top: rect.top, foot: Math.max(rect.bottom, foot) };
  });
  const gap = rows.findIndex(({ top, foot }) => y < (top + foot) / 2);
  const at = gap < 0 ? rows.length : gap;
  const edge = rows[at]?.top ?? rows.at(-1)?.foot ?? 0;
  const to = at > from ? at - 1 : at;
  return { from, to, top: edge - section.getBoundingClientRect().top };
}

/** Dragging a line by the number at its head, with mouse, pen or finger; Escape leaves it where it was. */
export function useRowDrag(sheet: SheetDesk, section: RefObject<HTMLElement | null>) {
  const [drag, setDrag] = useState<RowDrag | null>(null);
  const [dragger] = useState(() => new RowDragger(sheet, section, setDrag));
  useEffect(() => () => dragger.end(), [dragger]);
  return { drag, dragger };
}

export class RowDragger {
  private hand: Hand | null = null;
  private frame = 0;
  private last: RowDrag | null = null;
  /** A drag ends with a click on the number; that one opens nothing. */
  private swallow = false;

  constructor(
    private readonly sheet: SheetDesk,
    private readonly section: RefObject<HTMLElement | null>,
    private readonly show: (drag: RowDrag | null) => void,
  ) {}

  onPointerDown(event: PointerEvent<HTMLElement>, row: number): void {
    this.swallow = false;
    if (event.button !== 0 || !event.isPrimary) return;
    event.currentTarget.setPointerCapture(event.pointerId);
    const { pointerId, clientY } = event;
    this.hand = { row, pointerId, startY: clientY, y: clientY, moving: false };
    window.addEventListener('keydown', this.onKey, true);
  }

  onPointerMove(event: PointerEvent<HTMLElement>): void {
    const { hand } = this;
    if (!hand || hand.pointerId !== event.pointerId) return;
    hand.y = event.clientY;
    if (!hand.moving && Math.abs(hand.y - hand.startY) > SLACK) {
      hand.moving = true;
      this.sheet.say(`${this.name(hand)} in hand. Escape leaves it where it was.`);
      this.follow();
    }
  }

  onPointerUp(event: PointerEvent<HTMLElement>): void {
    const { hand, last } = this;
    if (!hand || hand.pointerId !== event.pointerId) return;
    this.swallow = hand.moving;
    this.end();
    if (!last || !hand.moving) return;
    if (last.to === last.from) this.sheet.say(`${this.name(hand)} stays line ${hand.row + 1}`);
    else this.sheet.move(last.from, last.to, 'number');
  }

  onPointerCancel(): void {
    if (this.hand?.moving) this.giveUp();
    else this.end();
  }

  /** Whether this click only ends a drag. */
  takesClick(): boolean {
    const { swallow } = this;
    this.swallow = false;
    return swallow;
  }

  end(): void {
    cancelAnimationFrame(this.frame);
    window.removeEventListener('keydown', this.onKey, true);
    this.hand = null;
    this.last = null;
    this.show(null);
  }

  private readonly onKey = (event: KeyboardEvent): void => {
    if (event.key !== 'Escape' || !this.hand?.moving) return;
    event.preventDefault();
    event.stopPropagation();
    this.swallow = true;
    this.giveUp();
  };

  private giveUp(): void {
    const { hand } = this;
    this.end();
    if (hand) this.sheet.say(`${this.name(hand)} stays line ${hand.row + 1}`);
  }

  private name({ row }: Hand): string {
    return nameOf(this.sheet.lines[row], row);
  }

  /** Once a frame: draws the list along near the window's edges, and lays the drop line anew. */
  private follow = (): void => {
    const { hand } = this;
    const section = this.section.current;
    if (!hand?.moving || !section) return;
    if (hand.y < EDGE) window.scrollBy(0, -STEP);
    else if (hand.y > window.innerHeight - EDGE) window.scrollBy(0, STEP);
    const next = placeAt(section, hand.row, hand.y);
    if (next.to !== this.last?.to || next.top !== this.last.top) {
      if (this.last && next.to !== this.last.to) {
        this.sheet.say(`${this.name(hand)}: would be line ${next.to + 1}`);
      }
      this.last = next;
      this.show(next);
    }
    this.frame = requestAnimationFrame(this.follow);
  };
}
