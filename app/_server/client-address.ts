import 'server-only';

/**
 * The address a request comes from. The server's start hook writes the peer of the connection into `x-fourfold-peer`;
 * X-Forwarded-For is believed only where that peer is one of the trusted proxies.
 */
export function clientAddress(request: Request, trustedProxies: string): string {
  const peer = request.headers.get('x-fourfold-peer') ?? 'unknown';
  const trusted = trustedProxies.split(',').map((entry) => entry.trim()).filter(Boolean);
  const forwarded = (request.headers.get('x-forwarded-for') ?? '').split(',').map((entry) => entry.trim()).filter(Boolean);
  if (!trusted.includes(peer)) return peer;
  return forwarded.findLast((address) => !trusted.includes(address)) ?? peer;
}
