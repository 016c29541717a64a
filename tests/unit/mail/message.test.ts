import { describe, expect, test } from 'vitest';
import { composeMail, mailOrder } from '@/lib/mail/message';

const INVITATION = {
  to: 'hamish.sorley@ardmore.example',
  template: 'invitation' as const,
  data: {
    givenName: 'Hamish',
    schoolName: 'Ardmore & District',
    invitedBy: 'Abena Osei',
    roles: ['teacher', 'head'],
    link: 'https://trymark.example.org/invitation/abc?x=1&y=2',
    days: 7,
  },
};

describe('an invitation', () => {
  test('says in plain text who invites, to which school and roles, where to go and for how long', async () => {
    const { to, subject, text } = await composeMail(INVITATION);
    expect(to).toBe(INVITATION.to);
    expect(subject).toBe('Your invitation to Ardmore & District');
    const words = text.replaceAll(/\s+/g, ' ');
    expect(words).toContain('Hello Hamish,');
    expect(words).toContain('Abena Osei has added you to Trymark at Ardmore & District as teacher and head.');
    expect(words).toContain(INVITATION.data.link);
    expect(words).toContain('The link works once and ends after 7 days.');
  });

  test('puts a name into HTML as text, never as markup', async () => {
    const givenName = '<img src=x onerror=alert(1)>';
    const { html } = await composeMail({ ...INVITATION, data: { ...INVITATION.data, givenName } });
    expect(html).not.toContain('<img src=x');
    expect(html).toContain('&lt;img');
  });
});

describe('a mail in the queue', () => {
  test('is refused when its address or its link is none', () => {
    expect(mailOrder.safeParse(INVITATION).success).toBe(true);
    expect(mailOrder.safeParse({ ...INVITATION, to: 'nobody' }).success).toBe(false);
    const data = { ...INVITATION.data, link: 'not a link' };
    expect(mailOrder.safeParse({ ...INVITATION, data }).success).toBe(false);
  });

  test('is refused when it names a template that there is none of', () => {
    expect(mailOrder.safeParse({ ...INVITATION, template: 'news' }).success).toBe(false);
  });
});
