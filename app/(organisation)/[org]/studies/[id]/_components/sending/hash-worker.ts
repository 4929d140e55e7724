import { sha256 } from '@noble/hashes/sha2.js';
import { toHex } from './fingerprint';

const chunk = 4 * 1024 * 1024;

/** Reads the file once, a piece at a time, beside whoever sends it. */
async function hash(file: Blob): Promise<void> {
  const sum = sha256.create();
  for (let from = 0; from < file.size; from += chunk) sum.update(new Uint8Array(await file.slice(from, from + chunk).arrayBuffer()));
  self.postMessage({ sha256: toHex(sum.digest()) });
}

self.onmessage = ({ data }: MessageEvent<Blob>) => {
  hash(data).catch(() => self.postMessage({ sha256: null }));
};
