import { z } from 'zod';
import { startMailbox } from './mailbox';
import { startS3 } from './s3';

/** Runs the stand-ins for the hosted services until it is ended. */
const settings = z
  .object({
    SERVICES_FOLDER: z.string(),
    SERVICES_SMTP_PORT: z.coerce.number(),
    SERVICES_MAILBOX_PORT: z.coerce.number(),
    SERVICES_S3_PORT: z.coerce.number(),
    S3_BUCKET: z.string(),
    S3_ACCESS_KEY_ID: z.string(),
    S3_SECRET_ACCESS_KEY: z.string(),
  })
  .parse(process.env);

const mailbox = await startMailbox({
  smtpPort: settings.SERVICES_SMTP_PORT,
  pagePort: settings.SERVICES_MAILBOX_PORT,
  folder: `${settings.SERVICES_FOLDER}/mail`,
});
const s3 = await startS3({
  port: settings.SERVICES_S3_PORT,
  folder: `${settings.SERVICES_FOLDER}/objects`,
  bucket: settings.S3_BUCKET,
  accessKeyId: settings.S3_ACCESS_KEY_ID,
  secretAccessKey: settings.S3_SECRET_ACCESS_KEY,
});

process.once('SIGTERM', () => {
  void Promise.all([mailbox.smtp.close(), mailbox.page.close(), s3.close()]).then(() => process.exit(0));
});
process.send?.('ready');
