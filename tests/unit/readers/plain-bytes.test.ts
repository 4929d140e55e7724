import { gzipSync } from 'node:zlib';
import { describe, expect, it } from 'vitest';
import { openPlainBytes } from '@/lib/readers/plain-bytes';

describe('openPlainBytes(source)', () => {
  it('unpacks a source that uses its buffer again', async () => {
    const text = Array.from({ length: 200_000 }, (_, i) => `${Math.sin(i)}\n`).join('');
    const packed = gzipSync(text, { level: 1 });
    async function* source() {
      const room = Buffer.alloc(50_000);
      for (let at = 0; at < packed.length; at += room.length) {
        yield room.subarray(0, packed.copy(room, 0, at));
        await Promise.resolve();
      }
    }
    const { chunks } = await openPlainBytes(source());
    const pieces: Buffer[] = [];
    for await (const piece of chunks) pieces.push(piece);
    expect(Buffer.concat(pieces).equals(Buffer.from(text))).toBe(true);
  });
});
