import { render } from '@react-email/components';
import { z } from 'zod';
import { InvitationMail, invitationSubject } from './templates/invitation';
import { PasswordResetMail, passwordResetSubject } from './templates/password-reset';

/** A mail as it waits in the queue: what is filled in, not what it looks like. */
export const mailOrder = z.discriminatedUnion('template', [
  z.object({
    to: z.email(),
    template: z.literal('invitation'),
    data: z.object({
      givenName: z.string(),
      schoolName: z.string(),
      invitedBy: z.string(),
      roles: z.array(z.string()).min(1),
      link: z.url(),
      days: z.number().int().positive(),
    }),
  }),
  z.object({
    to: z.email(),
    template: z.literal('password-reset'),
    data: z.object({
      givenName: z.string(),
      schoolName: z.string(),
      link: z.url(),
      minutes: z.number().int().positive(),
    }),
  }),
]);

export type MailOrder = z.output<typeof mailOrder>;

export interface Message {
  to: string;
  subject: string;
  html: string;
  text: string;
}

/** The mail as it is sent, as HTML and as plain text. */
export async function composeMail(order: MailOrder): Promise<Message> {
  const { subject, content } = fill(order);
  const [html, text] = await Promise.all([render(content), render(content, { plainText: true })]);
  return { to: order.to, subject, html, text };
}

function fill(order: MailOrder) {
  switch (order.template) {
    case 'invitation':
      return { subject: invitationSubject(order.data), content: <InvitationMail {...order.data} /> };
    case 'password-reset':
      return { subject: passwordResetSubject(), content: <PasswordResetMail {...order.data} /> };
  }
}
