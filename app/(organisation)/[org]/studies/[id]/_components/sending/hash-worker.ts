import { sha256 } from '@noble/hashes/sha2.js';
import { toHex } from './fingerprint';

const chunk = 1024 * 1024;

/** Reads the file once, beside whoever sends it, always into the same memory: a file may be larger than all there is. */
async function hash(file: Blob): Promise<void> {
  const sum = sha256.create();
  const reader = file.stream().getReader({ mode: 'byob' });
  let memory = new Uint8Array(chunk);
  for (;;) {
    const { value, done } = await reader.read(memory);
    if (value) sum.update(value);
    if (done) break;
    memory = new Uint8Array(value.buffer);
  }
  self.postMessage({ sha256: toHex(sum.digest()) });
}

self.onmessage = ({ data }: MessageEvent<Blob>) => {
  hash(data).catch(() => self.postMessage({ sha256: null }));
};
