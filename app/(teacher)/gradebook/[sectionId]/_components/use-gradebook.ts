'use client';

import useSWR from 'swr';
import type { z } from 'zod';
import {
  type ExplanationView,
  explanationSchema,
  type GradebookView,
  gradebookSchema,
} from '@/lib/contracts/gradebook';

const REFRESH_MS = 5_000;

async function fetchParsed<Schema extends z.ZodType>(url: string, schema: Schema): Promise<z.output<Schema>> {
  const response = await fetch(url, { headers: { accept: 'application/json' } });
  if (!response.ok) throw new Error(`the server answered ${response.status}`);
  return schema.parse(await response.json());
}

/** The gradebook, looked at again every few seconds while a sitting is open; `late` when it could not be. */
export function useGradebook(first: GradebookView): { book: GradebookView; late: boolean } {
  const isOpen = first.sittings.some(({ open }) => open);
  const { data, error } = useSWR(
    `/api/gradebook/${first.section.sectionId}`,
    (url) => fetchParsed(url, gradebookSchema),
    {
      fallbackData: first,
      refreshInterval: isOpen ? REFRESH_MS : 0,
      revalidateOnMount: false,
      keepPreviousData: true,
    },
  );
  return { book: data ?? first, late: error !== undefined };
}

export interface Explained {
  explanation: ExplanationView | undefined;
  failed: boolean;
}

/** Where the points of one attempt went; asked for again whenever the cell itself has changed. */
export function useExplanation(sectionId: string, attemptId: string | null, version: string): Explained {
  const { data, error } = useSWR(
    attemptId === null ? null : [`/api/gradebook/${sectionId}/cells/${attemptId}`, version],
    ([url]) => fetchParsed(url, explanationSchema),
    { revalidateOnFocus: false, keepPreviousData: false },
  );
  return { explanation: data, failed: error !== undefined };
}
