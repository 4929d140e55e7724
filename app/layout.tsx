import type { Metadata, Viewport } from 'next';
import { connection } from 'next/server';
import type { ReactNode } from 'react';
import './globals.css';

export const metadata: Metadata = {
  title: { default: 'Fourfold', template: '%s · Fourfold' },
  description: 'Shows that a solver converges at the order its scheme promises, release after release.',
};

export const viewport: Viewport = {
  width: 'device-width',
  initialScale: 1,
  themeColor: [
    { media: '(prefers-color-scheme: light)', color: '#fbfcfa' },
    { media: '(prefers-color-scheme: dark)', color: '#10181e' },
  ],
};

export default async function RootLayout({ children }: { children: ReactNode }) {
  // Every page is made for its request: the nonce of the content security policy is fresh each time.
  await connection();
  return (
    <html lang="en">
      <body>{children}</body>
    </html>
  );
}
