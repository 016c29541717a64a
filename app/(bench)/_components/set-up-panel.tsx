'use client';

import Link from 'next/link';
import { Segmented } from '@/components/ui/segmented';
import { useBench } from './bench-context';
import { BenchKey } from './bench-parts';
import { IDLE_MINUTES, LIGHTS } from './bench-settings';

const LIGHT_NAMES = { auto: 'as the device', light: 'light', dark: 'dark', glare: 'glare' } as const;

/** How this tablet's bench is lit, heard, walked and locked. */
export function SetUpPanel() {
  const { view, press, settings, change, open, practice, leaveTo } = useBench();
  return (
    <section aria-label="set up" className="flex min-h-0 flex-1 flex-col gap-5 overflow-y-auto py-3">
      <div className="flex items-start gap-3">
        <h2 className="flex-1 text-key">This tablet</h2>
        <BenchKey onPress={() => open(null)} className="min-w-28">
          close
        </BenchKey>
      </div>
      <Segmented
        label="how the sheet is lit"
        showLabel
        size="bench"
        options={LIGHTS.map((value) => ({ value, label: LIGHT_NAMES[value] }))}
        value={settings.light ?? 'auto'}
        onChange={(value) => change({ light: LIGHTS.find((each) => each === value) ?? 'auto' })}
      />
      <Segmented
        label="sounds"
        showLabel
        size="bench"
        options={[
          { value: 'on', label: 'in, off, refused' },
          { value: 'off', label: 'mute' },
        ]}
        value={settings.muted ? 'off' : 'on'}
        onChange={(value) => change({ muted: value === 'off' })}
      />
      <Segmented
        label="the cursor walks"
        showLabel
        size="bench"
        options={[
          { value: 'piece', label: 'piece by piece' },
          { value: 'line', label: 'down a line, one axis at a time' },
        ]}
        value={view.state.order}
        onChange={(value) => press({ do: 'order', order: value === 'line' ? 'line' : 'piece' })}
      />
      <Segmented
        label="locks itself after minutes untouched"
        showLabel
        size="bench"
        options={IDLE_MINUTES.map((minutes) => ({ value: String(minutes), label: String(minutes) }))}
        value={String(settings.idleMinutes)}
        onChange={(value) => change({ idleMinutes: Number(value) })}
      />
      <p>
        <Link href={leaveTo} className="link text-lead">
          {practice ? 'leave the practice round' : 'leave the round'}
        </Link>
      </p>
    </section>
  );
}
