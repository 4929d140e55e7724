import 'server-only';
import { createHash, timingSafeEqual } from 'node:crypto';

const digest = (text: string) => createHash('sha256').update(text).digest();
const isLoopback = (address: string) => address === '::1' || /^127\./.test(address);

/**
 * Whether the caller may read the metrics: with a token set whoever sends it; without one only this machine itself, and
 * nobody whom a proxy on this machine speaks for.
 */
export function mayReadMetrics(headers: Headers, token: string | undefined): boolean {
  if (token !== undefined) {
    const sent = /^Bearer (\S+)$/i.exec(headers.get('authorization') ?? '')?.[1];
    return sent !== undefined && timingSafeEqual(digest(sent), digest(token));
  }
  if (['forwarded', 'via', 'x-real-ip'].some((name) => headers.has(name))) return false;
  // Next itself names the peer in X-Forwarded-For where nobody else did.
  const addresses = [headers.get('x-fourfold-peer') ?? '', ...(headers.get('x-forwarded-for') ?? '').split(',')];
  return addresses.map((entry) => entry.trim().replace(/^::ffff:/, '')).every((entry, index) => (index > 0 && entry === '') || isLoopback(entry));
}
