'use client';

import { useEffect, useState, useSyncExternalStore } from 'react';
import type { BenchSession } from '@/lib/sync/client/bench-session';
import type { Lock } from '@/lib/sync/client/pin';
import { ActionRow } from './action-row';
import { type Bench, BenchProvider, type Panel } from './bench-context';
import { type BenchSettings, readSettings, writeSettings } from './bench-settings';
import { Board } from './board';
import { EntryZone } from './entry-zone';
import { KeptPanel } from './kept-panel';
import { LockScreen } from './lock-screen';
import { SetUpPanel } from './set-up-panel';
import { playSound } from './sounds';
import { Strip } from './strip';
import { StudentsPanel } from './students-panel';
import { TargetPanel } from './target-panel';
import { useIdle } from './use-idle';
import { useTypedLines } from './use-typed-lines';

interface BenchScreenProps {
  session: BenchSession;
  lock: Lock;
  practice: boolean;
  /** Where the way out leads. */
  leaveTo: string;
}

/** The bench: strip, pieces and target, entry, actions. */
export function BenchScreen({ session, lock: storedLock, practice, leaveTo }: BenchScreenProps) {
  const view = useSyncExternalStore(session.subscribe, session.getView, session.getView);
  const [settings, setSettings] = useState(readSettings);
  const [panel, setPanel] = useState<Panel>(null);
  const [lock, setLock] = useState(storedLock);
  const [choosing, setChoosing] = useState(false);
  const covered = lock.locked || choosing;

  const keepLock = (next: Lock) => {
    setLock(next);
    setChoosing(false);
    void session.writeLock(next);
  };
  const typing = useTypedLines(!covered && panel === null, (text, at) =>
    session.press(settings.entry === 'keypad' ? { do: 'keep', text } : { do: 'instrument', text, at }),
  );
  useIdle(!covered, settings.idleMinutes, () => keepLock({ ...lock, locked: true }));
  useLight(settings.light);
  useEffect(
    () => session.onSound((sound) => (settings.muted ? undefined : playSound(sound))),
    [session, settings.muted],
  );

  if (covered) {
    return (
      <LockScreen lock={lock} choosing={choosing} onLock={keepLock} onCancel={() => setChoosing(false)} />
    );
  }
  const change = (changed: Partial<BenchSettings>) => {
    const next = { ...settings, ...changed };
    setSettings(next);
    writeSettings(next);
  };
  const bench: Bench = {
    view,
    session,
    bundle: session.bundle,
    press: session.press,
    settings,
    change,
    panel,
    open: (next) => setPanel(next === panel ? null : next),
    lock: () => (lock.hash === null ? setChoosing(true) : keepLock({ ...lock, locked: true })),
    typing,
    practice,
    leaveTo,
  };
  return (
    <BenchProvider value={bench}>
      <main className="flex min-h-dvh flex-col gap-2 px-3 pt-[8px] pb-[10px] select-none lg:h-dvh lg:overflow-hidden lg:px-bench">
        <Strip />
        <Body panel={panel} />
      </main>
    </BenchProvider>
  );
}

function Body({ panel }: { panel: Panel }) {
  if (panel === 'students') return <StudentsPanel />;
  if (panel === 'kept') return <KeptPanel />;
  if (panel === 'set-up') return <SetUpPanel />;
  return (
    <>
      <div className="relative flex min-h-0 flex-1 flex-col-reverse gap-2 lg:flex-row">
        <Board />
        <TargetPanel />
      </div>
      <EntryZone />
      <ActionRow />
    </>
  );
}

/** The bench's own light, where one is chosen; the page's when it is left. */
function useLight(light: BenchSettings['light']): void {
  useEffect(() => {
    if (light === null) return;
    const { dataset } = document.documentElement;
    const before = dataset.theme;
    dataset.theme = light;
    return () => {
      if (before === undefined) delete dataset.theme;
      else dataset.theme = before;
    };
  }, [light]);
}
