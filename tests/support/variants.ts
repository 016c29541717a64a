import type { Actor } from '@/lib/auth/actor';
import { makeVariants } from '@/lib/data/practicals/make-variants';
import { type ProposedVariantsView, proposeVariants } from '@/lib/data/practicals/propose-variants';
import type { StarterId } from '@/lib/practicals/starter-plans';
import { makeStarter, publishDraft, valueFrom } from './practicals';

/** A starter that is published, of which variants can be made. */
export async function publishedStarter(actor: Actor, starter: StarterId) {
  const practicalId = await makeStarter(actor, starter);
  return { practicalId, ...(await publishDraft(actor, practicalId)) };
}

/** What is sent to make the proposals as they are. */
export function asProposed({ practicalId, original, proposals }: ProposedVariantsView) {
  return {
    practicalId,
    versionId: original.versionId,
    variants: proposals.map(({ letter, cutList }) => ({
      letter,
      lines: cutList.lines.map(({ id, target: { width, length } }) => ({ lineId: id, width, length })),
    })),
  };
}

/** Makes as many variants as are proposed of a practical. */
export async function makeProposed(actor: Actor, practicalId: string, count: number) {
  const proposed = valueFrom(await proposeVariants(actor, { practicalId, count }));
  return valueFrom(await makeVariants(actor, asProposed(proposed)));
}
