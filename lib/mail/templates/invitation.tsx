import { MailLayout, Sentence } from './layout';

export interface InvitationData {
  givenName: string;
  schoolName: string;
  invitedBy: string;
  roles: string[];
  link: string;
  /** Days until the link ends. */
  days: number;
}

export const invitationSubject = ({ schoolName }: InvitationData) => `Your invitation to ${schoolName}`;

export function InvitationMail({ givenName, schoolName, invitedBy, roles, link, days }: InvitationData) {
  return (
    <MailLayout
      preview={`${invitedBy} invites you to mark practicals at ${schoolName}.`}
      heading={`Join ${schoolName}`}
      action={{ label: 'Accept and choose a password', link }}
      closing={`The link works once and ends after ${days} days. If you do not know ${invitedBy}, leave this mail alone.`}
    >
      <Sentence>Hello {givenName},</Sentence>
      <Sentence>
        {invitedBy} has added you to Trymark at {schoolName} as {roles.join(' and ')}.
      </Sentence>
    </MailLayout>
  );
}
