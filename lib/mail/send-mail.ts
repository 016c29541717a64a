import 'server-only';
import { createTransport } from 'nodemailer';
import { composeMail, mailOrder } from './message';

export interface MailSettings {
  SMTP_URL?: string | undefined;
  MAIL_FROM: string;
}

/** Sends queued mail by SMTP; a failure is thrown, so that the queue tries again later. */
export function makeMailTask({ SMTP_URL, MAIL_FROM }: MailSettings) {
  const transport = SMTP_URL ? createTransport(SMTP_URL) : null;
  return async (payload: unknown): Promise<void> => {
    if (!transport) throw new Error('SMTP_URL is not set, so no mail can be sent.');
    const message = await composeMail(mailOrder.parse(payload));
    await transport.sendMail({ from: MAIL_FROM, ...message });
  };
}
