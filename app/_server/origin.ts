import 'server-only';
import { AppError } from '@/lib/errors';

const loopbackNames = ['localhost', '127.0.0.1'];

/** The public origin, and beside a loopback one its other name. */
function allowedOrigins(publicUrl: string): string[] {
  const url = new URL(publicUrl);
  if (!loopbackNames.includes(url.hostname)) return [url.origin];
  return loopbackNames.map((name) => `${url.protocol}//${name}${url.port === '' ? '' : `:${url.port}`}`);
}

/** A write that carries a cookie must say that it comes from our own pages. */
export function requireSameOrigin(request: Request, publicUrl: string, hasCookie: boolean): void {
  const origin = request.headers.get('origin');
  if (origin === null && !hasCookie) return;
  if (origin !== null && allowedOrigins(publicUrl).includes(origin)) return;
  throw new AppError('foreign-origin', 'A write with a session cookie must come from a page of this site. Scripts use a token.');
}
