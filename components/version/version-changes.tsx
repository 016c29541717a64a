import { StackedRules } from '@/components/rule/stacked-rules';
import { PhraseList } from '@/components/ui/phrase-list';
import { PhraseText } from '@/components/ui/phrase-text';
import { Heading } from '@/components/ui/titles';
import type { Unit } from '@/lib/length';
import { changedSizes } from '@/lib/practicals/changes-in-prices';
import type { ComparedSizes, Phrase } from '@/lib/practicals/compare-types';
import { ruleScaleOf } from '@/lib/practicals/rule-scale-of';
import type { Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';

interface VersionChangesProps {
  number: number;
  task: Task;
  rubric: Rubric;
  since: { number: number; changes: Phrase[]; rubric: Rubric };
}

/** What a version changed of the one before it, in words, and the prices that part laid over each other. */
export function VersionChanges({ number, task, rubric, since }: VersionChangesProps) {
  const { unit } = task;
  const sizes = changedSizes(since.rubric, { task, rubric });
  const labels = [`version ${since.number}`, `version ${number}`];
  return (
    <section aria-labelledby="changes-heading">
      <Heading id="changes-heading">What changed since version {since.number}</Heading>
      <PhraseList phrases={since.changes} unit={unit} className="mt-2 max-w-[76ch]" />
      {sizes.length > 0 ? (
        <div className="mt-5 grid gap-6">
          {sizes.map((group) => (
            <ChangedPrice key={JSON.stringify(group.name)} sizes={group} unit={unit} labels={labels} />
          ))}
        </div>
      ) : null}
    </section>
  );
}

interface ChangedPriceProps {
  sizes: ComparedSizes;
  unit: Unit;
  labels: readonly string[];
}

function ChangedPrice({ sizes: { name, sizes, prices }, unit, labels }: ChangedPriceProps) {
  const [first] = sizes;
  if (!first) return null;
  const scale = ruleScaleOf(
    prices.map(({ rule }) => rule),
    unit,
  );
  const rules = prices.map((price, index) => ({ id: String(index), label: labels[index] ?? '', ...price }));
  const props = { unit, target: first.target, rules, ...scale };
  return (
    <div className="break-inside-avoid">
      <div className="mb-1 flex flex-wrap items-baseline gap-x-4">
        <h3 className="font-[640] first-letter:uppercase">
          <PhraseText phrase={name} unit={unit} />
        </h3>
        <p className="text-label text-ink-2">
          they differ where the ground is tinted; drawn for {first.label}, {first.axis}
        </p>
      </div>
      <div className="max-md:hidden">
        <StackedRules {...props} />
      </div>
      <div className="md:hidden">
        <StackedRules {...props} variant="phone" />
      </div>
    </div>
  );
}
