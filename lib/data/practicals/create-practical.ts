import 'server-only';
import { createPracticalInput } from '@/lib/contracts/practicals';
import { emptyDraft } from '@/lib/practicals/empty-draft';
import { starterDraft } from '@/lib/practicals/starters';
import { defineVerb } from '../verb';
import { writePractical } from './new-practical';

export const createPractical = defineVerb({
  action: 'practical.create',
  input: createPracticalInput,
  async run(context): Promise<{ practicalId: string }> {
    const { actor, input, authorize, log } = context;
    authorize({ schoolId: actor.schoolId });
    const draft =
      input.from === 'starter' ? starterDraft(input.starter) : emptyDraft(input.unit, input.title);
    const practicalId = await writePractical(context, draft);
    const from = input.from === 'starter' ? { starter: input.starter } : {};
    await log({ subjectKind: 'practical', subjectId: practicalId, details: { made: draft.title, ...from } });
    return { practicalId };
  },
});
