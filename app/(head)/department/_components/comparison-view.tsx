import { StackedRules } from '@/components/rule/stacked-rules';
import { PhraseText } from '@/components/ui/phrase-text';
import { Heading, Verdict } from '@/components/ui/titles';
import type { VersionsComparison } from '@/lib/data/department/compare-versions';
import type { ComparedSizes } from '@/lib/practicals/compare-types';
import { ruleScaleOf } from '@/lib/practicals/rule-scale-of';

/** In words where the rubrics part, and each such size with its prices over each other. */
export function ComparisonView({ view }: { view: VersionsComparison }) {
  const { comparison, unit } = view;
  const apart = comparison.sizes.filter(({ spans }) => spans.length > 0);
  const alike = comparison.sizes.filter(({ spans }) => spans.length === 0);
  return (
    <div className="grid gap-8">
      <div className="grid gap-1">
        {comparison.sentences.map((sentence) => (
          <Verdict key={JSON.stringify(sentence)} className="max-w-[68ch]">
            <PhraseText phrase={sentence} unit={unit} />
          </Verdict>
        ))}
      </div>
      {apart.map((sizes) => (
        <Stack key={JSON.stringify(sizes.name)} sizes={sizes} view={view} />
      ))}
      {alike.map((sizes) => (
        <Stack key={JSON.stringify(sizes.name)} sizes={sizes} view={view} />
      ))}
    </div>
  );
}

function Stack({ sizes, view }: { sizes: ComparedSizes; view: VersionsComparison }) {
  const { unit, versions } = view;
  const [first] = sizes.sizes;
  if (!first) return null;
  const differs = sizes.spans.length > 0;
  const scale = ruleScaleOf(
    sizes.prices.map(({ rule }) => rule),
    unit,
  );
  const rules = sizes.prices.flatMap((price, index) => {
    const version = versions[index];
    return version ? [{ id: version.versionId, label: version.label, note: version.note, ...price }] : [];
  });
  const shown = differs
    ? rules
    : rules.slice(0, 1).map((rule) => ({ ...rule, label: 'all of them', note: undefined }));
  const props = { unit, target: first.target, rules: shown, ...scale };
  return (
    <section aria-label={sizes.sizes.map(({ label, axis }) => `${label}, ${axis}`).join('; ')}>
      <div className="mb-1 flex flex-wrap items-baseline gap-x-4">
        <Heading className="first-letter:uppercase">
          <PhraseText phrase={sizes.name} unit={unit} />
        </Heading>
        <p className="text-label text-ink-2">
          {differs ? 'they differ where the ground is tinted' : 'no difference'}; drawn for {first.label},{' '}
          {first.axis}
        </p>
      </div>
      <div className="max-md:hidden">
        <StackedRules {...props} />
      </div>
      <div className="md:hidden">
        <StackedRules {...props} variant="phone" />
      </div>
    </section>
  );
}
