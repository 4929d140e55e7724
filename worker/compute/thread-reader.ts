import type { GridReader } from '@/lib/services/reading/grid-reader';
import type { ThreadPool } from './thread-pool';

/** Reads files in the threads of the pool. */
export function createThreadReader(pool: ThreadPool): GridReader {
  return {
    async preview(storageKey, given) {
      const answer = await pool.run({ kind: 'preview', storageKey, given });
      if (answer.kind !== 'preview') throw new Error(`A preview was asked for; the thread answered ${answer.kind}.`);
      return answer.preview;
    },
    async difference(files, reading) {
      const answer = await pool.run({ kind: 'difference', ...files, reading });
      if (answer.kind !== 'difference') throw new Error(`A difference was asked for; the thread answered ${answer.kind}.`);
      return answer.result;
    },
    async read(file, reading, onProgress) {
      const answer = await pool.run({ kind: 'read', ...file, reading }, onProgress);
      if (answer.kind !== 'read') throw new Error(`A reading was asked for; the thread answered ${answer.kind}.`);
      return answer.result;
    },
  };
}
