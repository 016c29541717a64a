'use client';

import { useState } from 'react';
import type { OwnTaskView } from '@/lib/data/own/read-task';
import type { Unit } from '@/lib/length';
import { nextOpen } from '@/lib/practicals/own-record';
import { type AskedReading, readOwnEntry } from '@/lib/practicals/read-own-entry';
import { otherUnit, pressKey } from '@/lib/round/keypad';
import { findPiece } from '@/lib/round/pieces';
import type { Spot } from '@/lib/round/types';
import { type CellValue, cellKey } from '@/lib/sync/cells';
import type { OwnEntry, OwnSession, OwnView } from '@/lib/sync/client/own-session';

/** What the last press did: `refused` and `asked` stand until something else is pressed. */
export interface Told {
  kind: 'kept' | 'refused' | 'asked';
  text: string;
}

export type Instrument = 'rule' | 'caliper';

/** Where the student stands in measuring, and what each press does. */
export function useMeasuring(session: OwnSession, view: OwnView, { rubric, task }: OwnTaskView) {
  const [spot, setSpot] = useState<Spot | null>(() => nextOpen(rubric, view.record, null));
  const [text, setText] = useState('');
  const [unit, setUnit] = useState<Unit>(rubric.unit);
  const [instrument, setInstrument] = useState<Instrument>('rule');
  const [asked, setAsked] = useState<AskedReading | null>(null);
  const [told, setTold] = useState<Told | null>(null);
  const place = spot && findPiece(rubric, spot);
  const cell = spot && { lineId: spot.lineId, ordinal: spot.ordinal, what: spot.axis };

  function type(next: string) {
    setText(next);
    setAsked(null);
    setTold(null);
  }

  function point(to: Spot | null) {
    setSpot(to);
    type('');
  }

  async function enter(entries: OwnEntry[], words: string) {
    if (!(await session.enter(entries))) return;
    setTold({ kind: 'kept', text: words });
    setText('');
    setAsked(null);
    setSpot(nextOpen(rubric, session.getView().record, spot));
  }

  async function keep() {
    if (!place || !cell || !spot) return;
    const context = {
      line: place.line,
      axis: spot.axis,
      unit,
      grossLimit: rubric.grossLimit,
      margin: rubric.margin,
      blank: task.blank,
    };
    const outcome = readOwnEntry({ text, unit, instrument, cell: cellKey(cell), asked, context });
    if (outcome.does === 'refuse') return setTold({ kind: 'refused', text: outcome.reason });
    if (outcome.does === 'ask') {
      setAsked({ cell: cellKey(cell), ticks: outcome.ticks });
      return setTold({ kind: 'asked', text: `${outcome.asks} If you read that, keep it again.` });
    }
    const { ticks, source } = outcome;
    await enter(
      [{ cell, value: { kind: 'value', ticks }, source }],
      `${place.label}, ${spot.axis}: ${source.typed}`,
    );
  }

  const mark = async (value: CellValue, words: string) => {
    if (place && cell && spot) await enter([{ cell, value }], `${place.label}, ${spot.axis}: ${words}`);
  };

  const setPiece = async (state: 'missing' | 'present') => {
    if (!place || !spot) return;
    const of = { lineId: spot.lineId, ordinal: spot.ordinal, what: 'piece' };
    const words = state === 'missing' ? 'is missing' : 'is here';
    await enter([{ cell: of, value: { kind: 'state', state } }], `${place.label} ${words}`);
    if (state === 'present') setSpot(spot);
  };

  function key(pressed: string) {
    if (pressed === 'unit') {
      setUnit(otherUnit(unit));
      return type(text);
    }
    const next = pressKey(text, pressed);
    if (next !== null) type(next);
  }

  return {
    spot,
    place,
    cell,
    text,
    unit,
    instrument,
    told,
    type,
    point,
    keep,
    mark,
    setPiece,
    key,
    setInstrument,
  };
}

export type MeasuringState = ReturnType<typeof useMeasuring>;
