'use client';

import { useState } from 'react';
import type { Unit } from '@/lib/length';
import type { AskedReading } from '@/lib/practicals/read-own-entry';
import { otherUnit, pressKey } from '@/lib/round/keypad';

/** What the last press did: `refused` and `asked` stand until something else is pressed. */
export interface Told {
  kind: 'kept' | 'refused' | 'asked';
  text: string;
}

/** The text that is being typed, its unit, and what was said of it. */
export function useTyped(taskUnit: Unit) {
  const [text, setText] = useState('');
  const [unit, setUnit] = useState<Unit>(taskUnit);
  const [asked, setAsked] = useState<AskedReading | null>(null);
  const [told, setTold] = useState<Told | null>(null);

  function type(next: string) {
    setText(next);
    setAsked(null);
    setTold(null);
  }

  function key(pressed: string) {
    if (pressed === 'unit') {
      setUnit(otherUnit(unit));
      return type(text);
    }
    const next = pressKey(text, pressed);
    if (next !== null) type(next);
  }

  function ask(reading: AskedReading, words: string) {
    setAsked(reading);
    setTold({ kind: 'asked', text: words });
  }

  const refuse = (words: string) => setTold({ kind: 'refused', text: words });

  function clear(words: string) {
    type('');
    setTold({ kind: 'kept', text: words });
  }

  return { text, unit, asked, told, type, key, ask, refuse, clear };
}
