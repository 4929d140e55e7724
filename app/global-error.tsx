'use client';

import './globals.css';
import ErrorPage from './error';

/** Where even the frame of all pages failed: it is replaced whole. */
export default function GlobalError({ error }: { error: Error & { digest?: string } }) {
  return (
    <html lang="en">
      <body><ErrorPage error={error} /></body>
    </html>
  );
}
