import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import type { Task } from './task';

interface Written {
  task: Task;
  form: RubricForm;
  rubric: Rubric;
}

/** Whether two versions ask for the same work, price it alike and treat lateness, redo and prediction alike. */
export function sameInEffect(a: Written, b: Written): boolean {
  return canonical(a) === canonical(b);
}

function canonical({ task, form, rubric }: Written): string {
  return JSON.stringify(sorted({ task, rubric, policies: form.policies }));
}

/** Keys in order, since a database gives them back in its own. */
function sorted(value: unknown): unknown {
  if (Array.isArray(value)) return value.map(sorted);
  if (typeof value !== 'object' || value === null) return value;
  return Object.fromEntries(
    Object.entries(value)
      .sort(([a], [b]) => (a < b ? -1 : 1))
      .map(([key, each]) => [key, sorted(each)]),
  );
}
