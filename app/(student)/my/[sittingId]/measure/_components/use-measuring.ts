'use client';

import { useState } from 'react';
import type { OwnTaskView } from '@/lib/data/own/read-task';
import { nextOpen } from '@/lib/practicals/own-record';
import { readOwnEntry } from '@/lib/practicals/read-own-entry';
import { findPiece } from '@/lib/round/pieces';
import type { Spot } from '@/lib/round/types';
import { type CellValue, cellKey } from '@/lib/sync/cells';
import type { OwnEntry, OwnSession, OwnView } from '@/lib/sync/client/own-session';
import { useTyped } from './use-typed';

export type OwnInstrument = 'rule' | 'caliper';

/** Where the student stands in measuring, and what each press does. */
export function useMeasuring(session: OwnSession, view: OwnView, { rubric, task }: OwnTaskView) {
  const [spot, setSpot] = useState<Spot | null>(() => nextOpen(rubric, view.record, null));
  const [instrument, setInstrument] = useState<OwnInstrument>('rule');
  const typed = useTyped(rubric.unit);
  const place = (spot && findPiece(rubric, spot)) ?? null;
  const cell = spot && { lineId: spot.lineId, ordinal: spot.ordinal, what: spot.axis };

  function point(to: Spot) {
    setSpot(to);
    typed.type('');
  }

  async function enter(entry: OwnEntry, words: string, stay = false) {
    if (!(await session.enter([entry]))) return;
    typed.clear(words);
    if (!stay) setSpot(nextOpen(rubric, session.getView().record, spot));
  }

  async function keep() {
    if (!place || !cell || !spot) return;
    const { text, unit, asked } = typed;
    const { grossLimit, margin } = rubric;
    const context = { line: place.line, axis: spot.axis, unit, grossLimit, margin, blank: task.blank };
    const key = cellKey(cell);
    const outcome = readOwnEntry({ text, unit, instrument, cell: key, asked, context });
    if (outcome.does === 'refuse') return typed.refuse(outcome.reason);
    const { ticks } = outcome;
    if (outcome.does === 'ask') {
      return typed.ask({ cell: key, ticks }, `${outcome.asks} If you read that, keep it again.`);
    }
    const { source } = outcome;
    await enter(
      { cell, value: { kind: 'value', ticks }, source },
      `${place.label}, ${spot.axis}: ${source.typed}`,
    );
  }

  const mark = async (value: CellValue, words: string) => {
    if (place && cell)
      await enter({ cell, value }, `${place.label}, ${cell.what}: ${words}`, value.kind === 'cleared');
  };

  const setPiece = async (state: 'missing' | 'present') => {
    if (!place || !cell) return;
    const words = `${place.label} is ${state === 'missing' ? 'missing' : 'here'}`;
    await enter(
      { cell: { ...cell, what: 'piece' }, value: { kind: 'state', state } },
      words,
      state === 'present',
    );
  };

  return { ...typed, spot, place, cell, instrument, setInstrument, point, keep, mark, setPiece };
}

export type MeasuringState = ReturnType<typeof useMeasuring>;
