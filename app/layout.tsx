import type { Metadata, Viewport } from 'next';
import { cookies } from 'next/headers';
import { connection } from 'next/server';
import type { ReactNode } from 'react';
import { fontVariables } from '@/components/shell/fonts';
import { parseTheme, THEME_COOKIE } from '@/components/shell/theme';
import { Toaster } from '@/components/ui/toaster';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Trymark', template: '%s, Trymark' },
  description: 'A grading station for practical assessments in woodworking.',
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#F2F4F2' },
    { media: '(prefers-color-scheme: dark)', color: '#11171A' },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  await connection();
  const store = await cookies();
  const theme = parseTheme(store.get(THEME_COOKIE)?.value);
  return (
    <html lang="en" data-theme={theme} className={fontVariables} suppressHydrationWarning>
      <body>
        {children}
        <Toaster />
      </body>
    </html>
  );
}
