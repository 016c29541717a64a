import type { Submission, SubmissionResult } from '@conform-to/react';
import type { Result } from '@/lib/result';

/** What a form action hands back to its form: conform's reply, which keeps all that was typed. */
export type FormReply = SubmissionResult<string[]> | undefined;

/** A verb's answer as the form's reply: field messages at their fields, everything else above the form. */
export function replyTo<Schema, Value, T>(
  submission: Submission<Schema, string[], Value>,
  result: Result<T>,
): SubmissionResult<string[]> {
  if (result.ok) return submission.reply();
  const { code, message, fields } = result.problem;
  if (code !== 'invalid' || !fields) return submission.reply({ formErrors: [message] });
  const { '': formErrors, ...fieldErrors } = fields;
  return submission.reply({ formErrors: formErrors ?? [], fieldErrors: toConformNames(fieldErrors) });
}

/** `lines.2.width` as conform names it: `lines[2].width`. */
function toConformNames(fields: Record<string, string[]>): Record<string, string[]> {
  return Object.fromEntries(
    Object.entries(fields).map(([path, messages]) => [path.replaceAll(/\.(\d+)(?=\.|$)/g, '[$1]'), messages]),
  );
}
