'use client';

import { useState, useTransition } from 'react';
import { Segmented } from '@/components/ui/segmented';
import { parseTheme, THEMES, type Theme } from './theme';
import { setThemeAction } from './theme-action';

const LABELS: Record<Theme, string> = { auto: 'as the device', light: 'light', dark: 'dark' };

export function ThemeSwitch({ theme }: { theme: Theme }) {
  const [chosen, setChosen] = useState(theme);
  const [, startTransition] = useTransition();
  return (
    <Segmented
      label="how the sheet is lit"
      name="theme"
      options={THEMES.map((value) => ({ value, label: LABELS[value] }))}
      value={chosen}
      onChange={(value) => {
        const next = parseTheme(value);
        setChosen(next);
        document.documentElement.dataset.theme = next;
        startTransition(() => setThemeAction(next));
      }}
    />
  );
}
