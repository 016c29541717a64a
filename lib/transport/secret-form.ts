import type { Submission, SubmissionResult } from '@conform-to/react';
import type { Result } from '@/lib/result';
import { replyTo } from './form';

/** A form's reply that never sends a password or a link's secret back, whatever was wrong with the rest. */
export function replyWithoutSecrets<Schema, Value, T>(
  submission: Submission<Schema, string[], Value>,
  result: Result<T> | null,
  secrets: readonly string[],
): SubmissionResult<string[]> {
  const { initialValue, ...reply } = result ? replyTo(submission, result) : submission.reply();
  if (!initialValue) return reply;
  const kept = Object.entries(initialValue).filter(
    ([name]) => !secrets.includes(name) && !name.startsWith('$ACTION'),
  );
  return { ...reply, initialValue: Object.fromEntries(kept) };
}
