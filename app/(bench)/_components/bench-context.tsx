'use client';

import { createContext, useContext } from 'react';
import type { RoundBundle } from '@/lib/contracts/rounds';
import type { Action } from '@/lib/round/types';
import type { BenchSession, BenchView } from '@/lib/sync/client/bench-session';
import type { BenchSettings } from './bench-settings';

/** What lies over the cells and the entry: the roster, what is kept and sent, or how the bench is set up. */
export type Panel = 'students' | 'kept' | 'set-up' | null;

export interface Bench {
  view: BenchView;
  session: BenchSession;
  bundle: RoundBundle;
  press(action: Action): void;
  settings: BenchSettings;
  change(settings: Partial<BenchSettings>): void;
  panel: Panel;
  open(panel: Panel): void;
  lock(): void;
  /** What an instrument has typed of the line that is under way. */
  typing: string;
  practice: boolean;
  leaveTo: string;
}

const Context = createContext<Bench | null>(null);

export const BenchProvider = Context.Provider;

export function useBench(): Bench {
  const bench = useContext(Context);
  if (!bench) throw new Error('There is a bench inside a round alone.');
  return bench;
}
