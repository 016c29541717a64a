'use client';

import { useState } from 'react';
import { Button } from '@/components/ui/button';
import { Dialog } from '@/components/ui/dialog';
import { findPiece } from '@/lib/round/pieces';
import type { Spot } from '@/lib/round/types';
import type { Rubric } from '@/lib/scoring';

interface WhatIsLeftProps {
  rubric: Rubric;
  left: readonly Spot[];
  onPoint: (spot: Spot) => void;
}

/** The sizes a lock still waits for; a tap goes to one. */
export function WhatIsLeft({ rubric, left, onPoint }: WhatIsLeftProps) {
  const [open, setOpen] = useState(false);
  const words = left.length === 0 ? 'none left' : `${left.length} left`;
  return (
    <>
      <Button onClick={() => setOpen(true)} disabled={left.length === 0}>
        {words}
      </Button>
      <Dialog open={open} onOpenChange={setOpen} title={words}>
        <ul>
          {left.map((spot) => (
            <li key={`${spot.lineId}/${spot.ordinal}/${spot.axis}`} className="border-b border-hair">
              <button
                type="button"
                className="flex min-h-11 w-full items-center text-left text-act underline underline-offset-4"
                onClick={() => {
                  onPoint(spot);
                  setOpen(false);
                }}
              >
                {findPiece(rubric, spot)?.label}, {spot.axis}
              </button>
            </li>
          ))}
        </ul>
      </Dialog>
    </>
  );
}
