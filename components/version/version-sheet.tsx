import type { Phrase } from '@/lib/practicals/compare-types';
import type { Task } from '@/lib/practicals/task';
import type { Rubric } from '@/lib/scoring';
import type { RubricForm } from '@/lib/scoring/rubric-form';
import { VersionChanges } from './version-changes';
import { VersionCutList } from './version-cut-list';
import { VersionPrices } from './version-prices';
import { VersionRules } from './version-rules';
import { VersionTask } from './version-task';

export interface VersionSheetProps {
  number: number;
  task: Task;
  form: RubricForm;
  rubric: Rubric;
  /** The version before it, where there is one to be read. */
  since: { number: number; changes: Phrase[]; rubric: Rubric } | null;
}

/** A published version to be read from top to bottom: task, pieces, prices, rules. */
export function VersionSheet({ number, task, form, rubric, since }: VersionSheetProps) {
  return (
    <div className="grid grid-cols-[minmax(0,1fr)] gap-10">
      {since ? <VersionChanges {...{ number, task, rubric, since }} /> : null}
      <VersionTask task={task} />
      <VersionCutList task={task} rubric={rubric} />
      <VersionPrices rubric={rubric} />
      <VersionRules rubric={rubric} form={form} />
    </div>
  );
}
