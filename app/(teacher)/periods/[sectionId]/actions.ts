'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { revalidatePath } from 'next/cache';
import { currentActor } from '@/lib/auth/session';
import { addStudentInput, moveStudentInput } from '@/lib/contracts/sections';
import { makePassphrases, type PassphraseSlipsView } from '@/lib/data/account/make-passphrases';
import { type PassphraseSlip, resetPassphrase } from '@/lib/data/account/reset-passphrase';
import { type AddedStudentView, addStudent } from '@/lib/data/sections/add-student';
import { bringBackToSection } from '@/lib/data/sections/bring-back-section';
import { markLeftSection } from '@/lib/data/sections/mark-left-section';
import { type FormReply, replyTo } from '@/lib/transport/form';

export interface AddStudentState {
  reply: FormReply;
  /** Who was added last. */
  added: AddedStudentView | null;
}

export async function addStudentAction(_: AddStudentState, data: FormData): Promise<AddStudentState> {
  const submission = parseWithZod(data, { schema: addStudentInput });
  if (submission.status !== 'success') return { reply: submission.reply(), added: null };
  const result = await addStudent(await currentActor(), submission.value);
  if (!result.ok) return { reply: replyTo(submission, result), added: null };
  revalidatePath('/periods', 'layout');
  return { reply: submission.reply({ resetForm: true }), added: result.value };
}

export async function markLeftAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: moveStudentInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await markLeftSection(await currentActor(), submission.value);
  if (result.ok) revalidatePath('/periods', 'layout');
  return replyTo(submission, result);
}

/** What a press came to that shows no more than a refusal. */
export type PressReply = { refused: string } | undefined;

export async function bringBackAction(_: PressReply, data: FormData): Promise<PressReply> {
  const input = { sectionId: data.get('sectionId'), studentId: data.get('studentId') };
  const result = await bringBackToSection(await currentActor(), input);
  if (!result.ok) return { refused: result.problem.message };
  revalidatePath('/periods', 'layout');
  return undefined;
}

/** Words, to be shown this once. */
export type SlipsReply = { refused: string } | { slips: PassphraseSlipsView } | undefined;

export async function makeSlipsAction(_: SlipsReply, data: FormData): Promise<SlipsReply> {
  const result = await makePassphrases(await currentActor(), { sectionId: data.get('sectionId') });
  if (!result.ok) return { refused: result.problem.message };
  revalidatePath('/periods', 'layout');
  return { slips: result.value };
}

export type NewWordsReply = { refused: string } | { slip: PassphraseSlip } | undefined;

export async function newWordsAction(_: NewWordsReply, data: FormData): Promise<NewWordsReply> {
  const result = await resetPassphrase(await currentActor(), { studentId: data.get('studentId') });
  if (!result.ok) return { refused: result.problem.message };
  revalidatePath('/periods', 'layout');
  return { slip: result.value };
}
