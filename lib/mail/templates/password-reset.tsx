import { MailLayout, Sentence } from './layout';

export interface PasswordResetData {
  givenName: string;
  schoolName: string;
  link: string;
  /** Minutes until the link ends. */
  minutes: number;
}

export const passwordResetSubject = () => 'Choose a new password';

export function PasswordResetMail({ givenName, schoolName, link, minutes }: PasswordResetData) {
  return (
    <MailLayout
      preview="Somebody asked for a new password to your account."
      heading="Choose a new password"
      action={{ label: 'Choose a new password', link }}
      closing={`The link works once and ends after ${minutes} minutes. If you did not ask for it, do nothing: your password stays as it is.`}
    >
      <Sentence>Hello {givenName},</Sentence>
      <Sentence>Somebody, you we hope, asked for a new password to your account at {schoolName}.</Sentence>
    </MailLayout>
  );
}
