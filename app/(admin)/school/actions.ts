'use server';

import { parseWithZod } from '@conform-to/zod/v4';
import { redirect } from 'next/navigation';
import { currentActor } from '@/lib/auth/session';
import {
  addDepartmentInput,
  addTermInput,
  changeSchoolInput,
  changeTermInput,
  renameDepartmentInput,
} from '@/lib/contracts/school';
import { addDepartment } from '@/lib/data/school/add-department';
import { addTerm } from '@/lib/data/school/add-term';
import { changeSchool } from '@/lib/data/school/change-school';
import { changeTerm } from '@/lib/data/school/change-term';
import { renameDepartment } from '@/lib/data/school/rename-department';
import { type FormReply, replyTo } from '@/lib/transport/form';

export async function changeSchoolAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: changeSchoolInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await changeSchool(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect('/school');
}

export async function addTermAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: addTermInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await addTerm(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect('/school/terms');
}

export async function changeTermAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: changeTermInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await changeTerm(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect('/school/terms');
}

export async function addDepartmentAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: addDepartmentInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await addDepartment(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect('/school/departments');
}

export async function renameDepartmentAction(_: FormReply, data: FormData): Promise<FormReply> {
  const submission = parseWithZod(data, { schema: renameDepartmentInput });
  if (submission.status !== 'success') return submission.reply();
  const result = await renameDepartment(await currentActor(), submission.value);
  if (!result.ok) return replyTo(submission, result);
  redirect('/school/departments');
}
