import {
  Body,
  Button,
  Container,
  Head,
  Heading,
  Html,
  Link,
  Preview,
  Section,
  Text,
} from '@react-email/components';
import type { ReactNode } from 'react';

const ink = '#182024';
const font = { fontFamily: 'Helvetica, Arial, sans-serif', color: ink };

interface MailLayoutProps {
  preview: string;
  heading: string;
  children: ReactNode;
  action: { label: string; link: string };
  closing: string;
}

/** The one form that every mail has: a heading, a few sentences, one link, and what to do if it is not for you. */
export function MailLayout({ preview, heading, children, action, closing }: MailLayoutProps) {
  return (
    <Html lang="en">
      <Head />
      <Preview>{preview}</Preview>
      <Body style={{ ...font, backgroundColor: '#ffffff', margin: 0 }}>
        <Container style={{ maxWidth: '34rem', padding: '24px' }}>
          <Heading as="h1" style={{ fontSize: '22px', lineHeight: '28px', margin: '0 0 16px' }}>
            {heading}
          </Heading>
          {children}
          <Section style={{ margin: '24px 0' }}>
            <Button
              href={action.link}
              style={{ backgroundColor: ink, color: '#ffffff', padding: '12px 20px', borderRadius: '4px' }}
            >
              {action.label}
            </Button>
          </Section>
          <Sentence>Or open this address:</Sentence>
          <Link href={action.link} style={{ color: ink, wordBreak: 'break-all' }}>
            {action.link}
          </Link>
          <Sentence>{closing}</Sentence>
        </Container>
      </Body>
    </Html>
  );
}

export function Sentence({ children }: { children: ReactNode }) {
  return <Text style={{ fontSize: '16px', lineHeight: '24px', margin: '0 0 12px' }}>{children}</Text>;
}
