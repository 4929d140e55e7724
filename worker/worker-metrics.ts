import { Counter, Histogram, type Registry } from 'prom-client';
import type { JobName } from '@/lib/jobs/jobs';
import { createRegistry } from '@/lib/platform/metrics';
import type { GridReader } from '@/lib/services/reading/grid-reader';

export interface WorkerMetrics {
  registry: Registry;
  countJob(job: JobName, outcome: 'done' | 'failed', milliseconds: number): void;
  /** The reader, with every file it has read counted. */
  counting(reader: GridReader): GridReader;
}

/** Numbers of this worker process. */
export function createWorkerMetrics(pool: Parameters<typeof createRegistry>[1]): WorkerMetrics {
  const registry = createRegistry('worker', pool);
  const registers = [registry];
  const jobs = new Counter({ name: 'fourfold_jobs_total', help: 'Jobs ended, by how. A failed one is tried again.', labelNames: ['job', 'outcome'], registers });
  const seconds = new Histogram({
    name: 'fourfold_job_seconds', help: 'Time a job took.', labelNames: ['job'], buckets: [0.02, 0.1, 0.5, 2, 10, 60, 300, 1800], registers,
  });
  const files = new Counter({ name: 'fourfold_files_read_total', help: 'Files read to their end.', registers });
  const rows = new Counter({ name: 'fourfold_rows_read_total', help: 'Rows of files read to their end.', registers });
  const bytes = new Counter({ name: 'fourfold_bytes_read_total', help: 'Bytes of files, as far as they were read.', registers });

  return {
    registry,
    countJob(job, outcome, milliseconds) {
      jobs.inc({ job, outcome });
      seconds.observe({ job }, milliseconds / 1000);
    },
    counting: (reader) => ({
      preview: (storageKey, given) => reader.preview(storageKey, given),
      difference: (files, reading) => reader.difference(files, reading),
      async read(file, reading, onProgress) {
        let counted = 0;
        const countTo = (total: number) => {
          bytes.inc(Math.max(0, total - counted));
          counted = Math.max(counted, total);
        };
        const result = await reader.read(file, reading, (progress) => {
          countTo(progress.bytes);
          onProgress(progress);
        });
        countTo(result.bytes);
        files.inc();
        rows.inc(result.norms.rows);
        return result;
      },
    }),
  };
}
