import 'server-only';
import { subscribe } from 'node:diagnostics_channel';
import type { Logger } from '@/lib/platform/logger';
import type { WebMetrics } from './web-metrics';
import type { RequestRecord } from './request-record';

/** Asked every few seconds by machines; at the usual level they would hide everything else. */
const quietRoutes = new Set(['/health', '/ready', '/metrics', 'static']);

/** The route of a request: of the API its pattern, else what kind of thing it is, so that there are few. */
function routeOf({ route, path }: RequestRecord): string {
  if (route !== undefined) return route;
  if (path.startsWith('/api/')) return 'none';
  return path.startsWith('/_next/') || path === '/icon.svg' || path === '/favicon.ico' ? 'static' : 'page';
}

/** One line and one count for every request of this process once it is over. */
export function watchRequests(log: Logger, metrics: WebMetrics): void {
  subscribe('fourfold:request', (message) => {
    const record = message as RequestRecord;
    const route = routeOf(record);
    metrics.count(record, route);
    const line = {
      method: record.method, route, path: record.path, status: record.status, milliseconds: record.milliseconds, received: record.received, sent: record.sent,
      requestId: record.id, organisation: record.organisationId, user: record.userId, token: record.tokenId, error: record.error,
      ...(record.isCut ? { cut: true } : {}),
    };
    if (quietRoutes.has(route)) log.debug(line, 'request');
    else log.info(line, 'request');
  });
}
