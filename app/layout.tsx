import type { Metadata, Viewport } from 'next';
import type { ReactNode } from 'react';
import { figures, reading } from './fonts';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Holdfast', template: '%s · Holdfast' },
  description: 'From a plan and a pile of wood to a finished, square, safe piece, with or without a signal.',
  applicationName: 'Holdfast',
  appleWebApp: { capable: true, title: 'Holdfast', statusBarStyle: 'default' },
  formatDetection: { telephone: false, date: false, address: false, email: false },
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  viewportFit: 'cover',
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#f7f4ec' },
    { media: '(prefers-color-scheme: dark)', color: '#15181a' },
  ],
};

export default function RootLayout({ children }: { children: ReactNode }) {
  return (
    <html lang="en" className={`${figures.variable} ${reading.variable}`} suppressHydrationWarning>
      <body className="min-h-dvh antialiased">{children}</body>
    </html>
  );
}
