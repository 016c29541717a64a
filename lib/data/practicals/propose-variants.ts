import 'server-only';
import { selectPractical } from '@/db/queries/practicals';
import { proposeVariantsInput } from '@/lib/contracts/variants';
import { proposeVariants as proposeSizes } from '@/lib/practicals/propose-variants';
import {
  FIRST_GRADUATION,
  GRADUATION_TICKS,
  type VariantGraduation,
} from '@/lib/practicals/propose-variants-graduation';
import { nextLetters } from '@/lib/practicals/propose-variants-letters';
import type {
  OtherCutList,
  VariantProposal,
  VariantProposals,
} from '@/lib/practicals/propose-variants-types';
import { defineVerb } from '../verb';
import { cutListsOf, loadVariants, originalOf, type PublishedOriginal } from './load-variants';
import { practicalSubject } from './practical-subject';

export interface ProposedVariantsView extends Omit<VariantProposals, 'proposals'> {
  practicalId: string;
  title: string;
  unit: 'in' | 'mm';
  count: number;
  graduation: VariantGraduation;
  original: PublishedOriginal;
  /** The variants that there are already. */
  others: OtherCutList[];
  proposals: (VariantProposal & { letter: string })[];
}

/** Sizes for other periods by the product's rule, apart from the original and the variants that there are. */
export const proposeVariants = defineVerb({
  action: 'practical.read',
  input: proposeVariantsInput,
  async run(context): Promise<ProposedVariantsView> {
    const { actor, input, tx, found, authorize, refuse } = context;
    const row = found(await selectPractical(tx, actor.schoolId, input.practicalId));
    authorize(practicalSubject(row));
    if (await originalOf(context, row)) refuse('conflict', MADE_FROM_ORIGINAL);
    const { original: published, variants } = await loadVariants(context, row);
    const original = published ?? refuse('conflict', NOT_PUBLISHED);
    const { count } = input;
    const graduation = input.graduation ?? FIRST_GRADUATION[row.unit];
    const others = cutListsOf(variants);
    const { task, rubric } = original;
    const ticks = GRADUATION_TICKS[row.unit][graduation];
    const { proposals, step, stopped } = proposeSizes({ task, rubric, others, count, graduation: ticks });
    const letters = nextLetters(
      variants.map(({ title }) => title),
      proposals.length,
    );
    return {
      ...{ practicalId: row.id, title: row.title, unit: row.unit },
      ...{ count, graduation, original, others, step, stopped },
      proposals: proposals.map((proposal, index) => ({ ...proposal, letter: letters[index] ?? '' })),
    };
  },
});

export const NOT_PUBLISHED = 'Publish the practical first; then make variants of it.';

export const MADE_FROM_ORIGINAL =
  'This practical is a variant itself. Make others from its original, so that they stay apart from each other.';
