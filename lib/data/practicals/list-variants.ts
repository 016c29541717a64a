import 'server-only';
import { selectPractical } from '@/db/queries/practicals';
import { listVariantsInput } from '@/lib/contracts/variants';
import { defineVerb } from '../verb';
import {
  type GivenPeriod,
  loadVariants,
  originalOf,
  type PublishedOriginal,
  type VariantView,
} from './load-variants';
import { practicalSubject } from './practical-subject';

export interface VariantListView {
  practicalId: string;
  title: string;
  unit: 'in' | 'mm';
  /** The practical it is a variant of, if it is one. */
  of: { practicalId: string; number: number } | null;
  original: PublishedOriginal | null;
  /** The periods that the original itself is given to. */
  periods: GivenPeriod[];
  variants: VariantView[];
}

/** A practical's variants with what is published of each, its sizes, and the periods that have it. */
export const listVariants = defineVerb({
  action: 'practical.read',
  input: listVariantsInput,
  async run(context): Promise<VariantListView> {
    const { actor, input, tx, found, authorize } = context;
    const row = found(await selectPractical(tx, actor.schoolId, input.practicalId));
    authorize(practicalSubject(row));
    const { id: practicalId, title, unit } = row;
    const of = await originalOf(context, row);
    return { practicalId, title, unit, of, ...(await loadVariants(context, row)) };
  },
});
