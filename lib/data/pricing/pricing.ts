import type { PredictionPolicy, Rubric } from '@/lib/scoring';
import { type Modification, modifyRubric } from '@/lib/scoring/modification';

/** A published version as far as an attempt is priced by it. */
export interface PublishedVersion {
  versionId: string;
  number: number;
  rubric: Rubric;
  policy: PredictionPolicy;
}

/** A version as it prices one student's work: `rubric` is modified where a modification stands. */
export interface PricedVersion extends PublishedVersion {
  published: Rubric;
  modification: Modification | null;
}

/** By what one attempt is priced, and the earlier versions under which its score may not be lower. */
export interface Pricing extends PricedVersion {
  accommodationId: string | null;
  /** The latest first. */
  held: PricedVersion[];
}

export interface StandingAccommodation {
  accommodationId: string;
  modification: Modification;
}

/**
 * Makes pricings out of versions read once; the same one for the same question, so that a class without modified
 * rubrics is priced by one rubric laid out once.
 */
export class PriceBook {
  private readonly versions: ReadonlyMap<string, PublishedVersion>;
  private readonly priced = new Map<string, PricedVersion>();
  private readonly pricings = new Map<string, Pricing>();

  constructor(versions: readonly PublishedVersion[]) {
    this.versions = new Map(versions.map((version) => [version.versionId, version]));
  }

  pricing(
    versionId: string,
    heldIds: readonly string[],
    accommodation: StandingAccommodation | null = null,
  ): Pricing {
    const key = [versionId, accommodation?.accommodationId ?? '', ...heldIds].join(' ');
    const known = this.pricings.get(key);
    if (known) return known;
    const pricing = {
      ...this.version(versionId, accommodation),
      accommodationId: accommodation?.accommodationId ?? null,
      held: heldIds.map((id) => this.version(id, accommodation)),
    };
    this.pricings.set(key, pricing);
    return pricing;
  }

  private version(versionId: string, accommodation: StandingAccommodation | null): PricedVersion {
    const key = `${versionId} ${accommodation?.accommodationId ?? ''}`;
    const known = this.priced.get(key);
    if (known) return known;
    const published = this.versions.get(versionId);
    if (!published) throw new Error(`rubric version ${versionId} is not there`);
    const priced = priceVersion(published, accommodation?.modification ?? null);
    this.priced.set(key, priced);
    return priced;
  }
}

export function priceVersion(version: PublishedVersion, modification: Modification | null): PricedVersion {
  const { rubric } = version;
  return {
    ...version,
    published: rubric,
    modification,
    rubric: modification ? modifyRubric(rubric, modification) : rubric,
  };
}
