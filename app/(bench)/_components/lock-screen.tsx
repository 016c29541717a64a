'use client';

import { useEffect, useState } from 'react';
import { Mark } from '@/components/shell/mark';
import { classNames } from '@/components/ui/class-names';
import { choosePin, LONGEST_PIN, type Lock, SHORTEST_PIN, tryPin } from '@/lib/sync/client/pin';

interface LockScreenProps {
  lock: Lock;
  /** Choosing a PIN was asked for, and none stands yet. */
  choosing: boolean;
  onLock: (lock: Lock) => void;
  onCancel: () => void;
}

/** Covers the bench. Its keys are on the screen alone: what an instrument types is no try. */
export function LockScreen({ lock, choosing, onLock, onCancel }: LockScreenProps) {
  const [pin, setPin] = useState('');
  const [first, setFirst] = useState<string | null>(null);
  const [told, setTold] = useState<string | null>(null);
  const [busy, setBusy] = useState(false);
  const wait = useSecondsUntil(lock.waitUntil);
  useDeafToInstruments();
  const open = lock.hash === null && !choosing;

  async function enter() {
    setPin('');
    if (Date.now() < lock.waitUntil) return;
    if (pin.length < SHORTEST_PIN) return setTold(`A PIN has ${SHORTEST_PIN} to ${LONGEST_PIN} digits.`);
    setBusy(true);
    try {
      if (!choosing) {
        const tried = await tryPin(lock, pin, Date.now());
        if (tried.locked) setTold('That is not the PIN of this tablet. Nothing was lost.');
        onLock(tried);
      } else if (first === null) {
        setFirst(pin);
        setTold(null);
      } else if (first === pin) onLock({ ...(await choosePin(pin)), locked: true });
      else {
        setFirst(null);
        setTold('The two were not the same. Choose again.');
      }
    } finally {
      setBusy(false);
    }
  }

  const title = choosing ? (first === null ? 'Choose a PIN for this tablet' : 'The same again') : 'Locked';
  return (
    <main className="fixed inset-0 z-50 flex flex-col items-center justify-center gap-6 bg-sheet p-4 text-center">
      <h1 className="flex items-end gap-3 border-b-edge border-ink px-6 font-title text-title">
        <Mark className="h-10 w-auto" />
        <span className="pb-1">{title}</span>
      </h1>
      {open ? (
        <>
          <p className="max-w-md text-lead text-ink-2">
            This tablet has no PIN, so anybody can open it. The readings are kept.
          </p>
          <button
            type="button"
            onClick={() => onLock({ ...lock, locked: false })}
            className="min-h-touch min-w-40 border-outline border-act bg-act px-6 text-key text-on-act"
          >
            open
          </button>
        </>
      ) : (
        <>
          <p className="tnum h-12 min-w-56 border-b-outline border-ink text-[40px] leading-none tracking-[0.3em]">
            <span aria-hidden="true">{'•'.repeat(pin.length)}</span>
            <span className="sr-only">{pin.length} digits</span>
          </p>
          <p role="status" className="min-h-12 max-w-md text-lead">
            {wait > 0
              ? `Wait ${wait} s. Nothing is lost meanwhile.`
              : (told ?? (choosing ? 'It opens this screen again, here only.' : ''))}
          </p>
          <Keys
            disabled={busy || wait > 0}
            onDigit={(digit) => setPin((before) => (before + digit).slice(0, LONGEST_PIN))}
            onRub={() => setPin((before) => before.slice(0, -1))}
            onEnter={() => void enter()}
            enter={choosing ? 'keep' : 'open'}
          />
          {choosing ? (
            <button type="button" onClick={onCancel} className="link min-h-11 text-lead">
              go on without a lock
            </button>
          ) : (
            <p className="max-w-md text-text text-ink-2">
              PIN forgotten?{' '}
              <a href="/sign-in" className="link">
                Sign in again
              </a>
              : what is kept here stays and is sent on.
            </p>
          )}
        </>
      )}
    </main>
  );
}

interface KeysProps {
  disabled: boolean;
  enter: string;
  onDigit: (digit: string) => void;
  onRub: () => void;
  onEnter: () => void;
}

function Keys({ disabled, enter, onDigit, onRub, onEnter }: KeysProps) {
  const key =
    'min-h-touch min-w-touch border-outline border-ink bg-plate text-[32px] font-[640] select-none active:bg-ink active:text-sheet disabled:border-dashed disabled:text-ink-2';
  return (
    <div className="grid grid-cols-3 gap-2">
      {[...'123456789'].map((digit) => (
        <button key={digit} type="button" disabled={disabled} onClick={() => onDigit(digit)} className={key}>
          {digit}
        </button>
      ))}
      <button
        type="button"
        disabled={disabled}
        onClick={onRub}
        className={classNames(key, 'narrow text-[20px]')}
      >
        rub out
      </button>
      <button type="button" disabled={disabled} onClick={() => onDigit('0')} className={key}>
        0
      </button>
      <button
        type="button"
        disabled={disabled}
        onClick={onEnter}
        className={classNames(key, 'border-act bg-act text-[24px] text-on-act')}
      >
        {enter}
      </button>
    </div>
  );
}

/** An instrument ends its line with Enter, which would press the key that was touched last. */
function useDeafToInstruments(): void {
  useEffect(() => {
    let digitAt = -Infinity;
    const onKey = (event: KeyboardEvent) => {
      if (/^[0-9.,+-]$/.test(event.key)) digitAt = performance.now();
      if ((event.key === 'Enter' || event.key === 'Tab') && performance.now() - digitAt < 1_000)
        event.preventDefault();
    };
    document.addEventListener('keydown', onKey, { capture: true });
    return () => document.removeEventListener('keydown', onKey, { capture: true });
  }, []);
}

/** Counted by a timer of its own; a moment that has passed is 0. */
function useSecondsUntil(time: number): number {
  const [seconds, setSeconds] = useState(0);
  useEffect(() => {
    const left = () => Math.max(0, Math.ceil((time - Date.now()) / 1000));
    const timer = setInterval(() => {
      setSeconds(left());
      if (left() === 0) clearInterval(timer);
    }, 200);
    return () => clearInterval(timer);
  }, [time]);
  return seconds;
}
