import type { Metadata, Viewport } from 'next';
import type { ReactNode } from 'react';
import { ThemeScript } from '@/components/register/theme';
import { figures, words } from './fonts';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Evenrun', template: '%s · Evenrun' },
  description: 'The condition and balance register of a plant’s rotating machines',
};

export const viewport: Viewport = { width: 'device-width', initialScale: 1 };

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" className={`${words.variable} ${figures.variable}`} suppressHydrationWarning>
      <head>
        <ThemeScript />
      </head>
      <body>{children}</body>
    </html>
  );
}
