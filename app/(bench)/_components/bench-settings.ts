import { z } from 'zod';

export const ENTRIES = ['rule', 'keypad', 'caliper'] as const;

export const LIGHTS = ['auto', 'light', 'dark', 'glare'] as const;

export const IDLE_MINUTES = [2, 5, 10, 20, 60] as const;

const settingsSchema = z.object({
  entry: z.enum(ENTRIES).catch('rule'),
  light: z.enum(LIGHTS).nullable().catch(null),
  muted: z.boolean().catch(false),
  idleMinutes: z.number().min(1).max(240).catch(10),
});

/** How this tablet's bench is set up; nothing of any student is in it. */
export type BenchSettings = z.infer<typeof settingsSchema>;

const KEY = 'trymark-bench';

export function readSettings(): BenchSettings {
  return settingsSchema.parse(parse(localStorage.getItem(KEY)));
}

export function writeSettings(settings: BenchSettings): void {
  localStorage.setItem(KEY, JSON.stringify(settings));
}

function parse(text: string | null): unknown {
  try {
    return JSON.parse(text ?? '{}') ?? {};
  } catch {
    return {};
  }
}
