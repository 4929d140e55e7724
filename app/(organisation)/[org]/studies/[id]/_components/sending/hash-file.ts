import { changedFile } from './send-fault';

export interface Hashing { sha256: Promise<string>; stop: () => void }

/** The SHA-256 of the whole file, computed in a worker while it is sent. It fails where the file cannot be read any more. */
export function hashFile(file: File): Hashing {
  const worker = new Worker(new URL('./hash-worker.ts', import.meta.url), { type: 'module' });
  const sha256 = new Promise<string>((resolve, reject) => {
    worker.onmessage = ({ data }: MessageEvent<{ sha256: string | null }>) => {
      worker.terminate();
      if (data.sha256 === null) reject(changedFile(file.name));
      else resolve(data.sha256);
    };
    worker.onerror = () => {
      worker.terminate();
      reject(new Error('The file could not be checked in this browser. Reload the page and choose the file again.'));
    };
  });
  // Asked for only once all parts are stored; until then a failure is nobody's.
  sha256.catch(() => undefined);
  worker.postMessage(file);
  return { sha256, stop: () => worker.terminate() };
}
