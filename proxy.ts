import { NextResponse, type NextRequest } from 'next/server';

const linkPages = new Set(['/accept-invitation', '/reset-password']);

function policy(nonce: string): string {
  const isDevelopment = process.env.NODE_ENV === 'development';
  const storage = process.env.STORAGE_PUBLIC_URL ? ` ${new URL(process.env.STORAGE_PUBLIC_URL).origin}` : '';
  return [
    "default-src 'self'",
    `script-src 'self' 'nonce-${nonce}' 'strict-dynamic'${isDevelopment ? " 'unsafe-eval'" : ''}`,
    // The typesetter and the figures place their parts by style attributes.
    "style-src 'self' 'unsafe-inline'",
    "img-src 'self' data: blob:",
    "font-src 'self'",
    `connect-src 'self'${storage}`,
    "worker-src 'self' blob:",
    "object-src 'none'",
    "base-uri 'none'",
    "form-action 'self'",
    "frame-ancestors 'none'",
  ].join('; ');
}

/** A content security policy with a fresh nonce for each page, and the address of the page for its server part. */
export function proxy(request: NextRequest): NextResponse {
  const nonce = Buffer.from(crypto.randomUUID()).toString('base64');
  const csp = policy(nonce);
  const headers = new Headers(request.headers);
  headers.set('x-fourfold-path', `${request.nextUrl.pathname}${request.nextUrl.search}`);
  headers.set('content-security-policy', csp);
  const response = NextResponse.next({ request: { headers } });
  response.headers.set('content-security-policy', csp);
  // The address of these holds a secret.
  response.headers.set('referrer-policy', linkPages.has(request.nextUrl.pathname) ? 'no-referrer' : 'same-origin');
  response.headers.set('x-content-type-options', 'nosniff');
  return response;
}

// Never the API: a body that passes through here is cut at 10 MB.
export const config = { matcher: ['/((?!api/|_next/|icon\\.svg|favicon\\.ico).*)'] };
