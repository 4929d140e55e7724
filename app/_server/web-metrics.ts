import 'server-only';
import { Counter, Gauge, Histogram, type Registry } from 'prom-client';
import { createRegistry } from '@/lib/platform/metrics';
import type { ServiceMeasures } from '@/lib/services/service/measure-service';
import type { RequestRecord } from './request-record';

export interface WebMetrics {
  registry: Registry;
  count(record: RequestRecord, route: string): void;
  /** What is true of the whole installation, read from database and queue just now. */
  setMeasures(measures: ServiceMeasures): void;
}

/** Numbers of this web process, and at each look those of the whole installation. */
export function createWebMetrics(pool: Parameters<typeof createRegistry>[1]): WebMetrics {
  const registry = createRegistry('web', pool);
  const registers = [registry];
  const requests = new Counter({ name: 'fourfold_http_requests_total', help: 'Requests answered.', labelNames: ['method', 'route', 'status'], registers });
  const seconds = new Histogram({
    name: 'fourfold_http_request_seconds', help: 'Time from the first byte of a request to the last of its answer.', labelNames: ['route'],
    buckets: [0.005, 0.02, 0.05, 0.1, 0.25, 0.5, 1, 2.5, 10, 60], registers,
  });
  const received = new Counter({ name: 'fourfold_http_received_bytes_total', help: 'Bytes of request bodies.', labelNames: ['route'], registers });
  const sent = new Counter({ name: 'fourfold_http_sent_bytes_total', help: 'Bytes of answers, with their headers.', labelNames: ['route'], registers });
  const errors = new Counter({ name: 'fourfold_errors_total', help: 'Refusals and faults by the code of the problem.', labelNames: ['code'], registers });
  const queued = new Gauge({ name: 'fourfold_queue_jobs', help: 'Jobs in the queue by state.', labelNames: ['state'], registers });
  const outbox = new Gauge({ name: 'fourfold_outbox_jobs', help: 'Jobs that are not done, by name and state.', labelNames: ['job', 'state'], registers });
  const oldest = new Gauge({ name: 'fourfold_outbox_oldest_seconds', help: 'Age of the oldest job that is not done.', labelNames: ['job'], registers });
  const uploads = new Gauge({ name: 'fourfold_uploads_open', help: 'Files on their way.', registers });
  const mailGauge = new Gauge({ name: 'fourfold_mails', help: 'Mails that are not out, by state.', labelNames: ['state'], registers });

  return {
    registry,
    count({ method, status, milliseconds, received: bytesIn, sent: bytesOut, error }, route) {
      requests.inc({ method, route, status });
      seconds.observe({ route }, milliseconds / 1000);
      received.inc({ route }, bytesIn);
      sent.inc({ route }, bytesOut);
      if (error !== undefined) errors.inc({ code: error });
    },
    setMeasures({ queue, jobs, openUploads, mails }) {
      for (const [state, count] of Object.entries(queue)) queued.set({ state }, count);
      outbox.reset();
      oldest.reset();
      for (const { job, state, count, oldestSeconds } of jobs) {
        outbox.set({ job, state }, count);
        oldest.set({ job }, Math.max(oldestSeconds, 0));
      }
      uploads.set(openUploads);
      for (const [state, count] of Object.entries(mails)) mailGauge.set({ state }, count);
    },
  };
}
