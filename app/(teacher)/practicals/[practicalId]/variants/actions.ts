'use server';

import { revalidatePath } from 'next/cache';
import type { z } from 'zod';
import { currentActor } from '@/lib/auth/session';
import type { makeVariantsInput } from '@/lib/contracts/variants';
import { makeVariants } from '@/lib/data/practicals/make-variants';
import { takePrices } from '@/lib/data/practicals/take-prices';

export type MakeReply = { made: string[] } | { message: string; fields: Record<string, string[]> };

/** Makes the variants that were chosen, all or none. */
export async function makeVariantsAction(input: z.input<typeof makeVariantsInput>): Promise<MakeReply> {
  const result = await makeVariants(await currentActor(), input);
  if (!result.ok) return { message: result.problem.message, fields: result.problem.fields ?? {} };
  revalidatePath('/practicals', 'layout');
  return { made: result.value.map(({ title }) => title) };
}

/** What a press that went wrong says; after one that went well the list shows that the prices agree. */
export async function takePricesAction(
  _: { message: string } | undefined,
  data: FormData,
): Promise<{ message: string } | undefined> {
  const text = (name: string) => data.get(name)?.toString() ?? '';
  const input = {
    practicalId: text('practicalId'),
    revision: Number(text('revision')),
    versionId: text('versionId'),
  };
  const result = await takePrices(await currentActor(), input);
  if (!result.ok) return { message: result.problem.message };
  revalidatePath('/practicals', 'layout');
  return undefined;
}
