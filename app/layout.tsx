import type { Metadata, Viewport } from 'next';
import { cookies } from 'next/headers';
import type { ReactNode } from 'react';
import { parseTheme, themeCookie } from '@/lib/client/theme';
import { fontClasses } from './fonts';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Wakewright', template: '%s · Wakewright' },
  description: 'Keeps a hire fleet of personal watercraft and small powerboats fit to launch.',
  icons: { icon: '/mark.svg' },
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  viewportFit: 'cover',
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#f5ebd0' },
    { media: '(prefers-color-scheme: dark)', color: '#282414' },
  ],
};

/** The theme comes from a cookie, so the first frame needs no script and never flashes. */
export default async function RootLayout({ children }: { children: ReactNode }) {
  const theme = parseTheme((await cookies()).get(themeCookie)?.value);
  return (
    <html lang="en" className={fontClasses} data-theme={theme === 'device' ? undefined : theme}>
      <body>{children}</body>
    </html>
  );
}
