'use client';

import { Button } from '@/components/ui/button';
import { Segmented } from '@/components/ui/segmented';
import type { OwnRecord } from '@/lib/practicals/own-record';
import { pieceStateAt } from '@/lib/round/record';
import type { MeasuringState } from './use-measuring';

/** What a size can be besides a number, and what it is read with. */
export function WhatElse({ measuring, record }: { measuring: MeasuringState; record: OwnRecord }) {
  const { spot, mark, setPiece, instrument, setInstrument } = measuring;
  const missing = spot !== null && pieceStateAt(record, spot) === 'missing';
  const slim = 'min-h-12 flex-1 px-1 text-label not-first:-ml-px';
  return (
    <>
      <div className="mt-2 flex">
        <Button className={slim} onClick={() => void mark({ kind: 'unreadable' }, 'couldn’t read')}>
          couldn’t read
        </Button>
        <Button className={slim} onClick={() => void mark({ kind: 'spoiled' }, 'spoiled')}>
          spoiled
        </Button>
        {missing ? (
          <Button className={slim} onClick={() => void setPiece('present')}>
            piece is here
          </Button>
        ) : (
          <Button className={slim} onClick={() => void setPiece('missing')}>
            piece is missing
          </Button>
        )}
      </div>
      <Segmented
        label="read with"
        showLabel
        className="mt-3"
        options={[
          { value: 'rule', label: 'a rule' },
          { value: 'caliper', label: 'a caliper' },
        ]}
        value={instrument}
        onChange={(value) => setInstrument(value === 'caliper' ? 'caliper' : 'rule')}
      />
    </>
  );
}
