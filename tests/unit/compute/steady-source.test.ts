import { Readable } from 'node:stream';
import { describe, expect, it } from 'vitest';
import { steadySource } from '@/worker/compute/steady-source';

const pieceBytes = 8 * 1024 * 1024;

describe('steadySource', () => {
  it('gives every piece in order and keeps none of them', async () => {
    const count = 80;
    const open = () => Promise.resolve(Readable.from((function* () {
      for (let piece = 0; piece < count; piece += 1) yield Buffer.alloc(pieceBytes, piece);
    })()));
    const before = process.memoryUsage().arrayBuffers;
    let [pieces, most] = [0, 0];
    for await (const piece of steadySource({ open, stallSeconds: 5, onPiece: () => undefined })) {
      expect(piece[0]).toBe(pieces);
      pieces += 1;
      most = Math.max(most, process.memoryUsage().arrayBuffers - before);
    }
    expect(pieces).toBe(count);
    expect(most).toBeLessThan((count * pieceBytes) / 2);
  });

  it('throws where nothing comes for a while, saying how far it was', async () => {
    const open = () => Promise.resolve(new Readable({ read() { if (this.readableDidRead) return; this.push(Buffer.alloc(10)); } }));
    const read = async () => {
      for await (const piece of steadySource({ open, stallSeconds: 0.2, onPiece: () => undefined })) expect(piece).toHaveLength(10);
    };
    await expect(read()).rejects.toThrow('Storage sent nothing for 0.2 s after');
  });
});
