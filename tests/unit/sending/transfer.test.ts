import { describe, expect, it } from 'vitest';
import { fingerprintOf } from '@/app/(organisation)/[org]/studies/[id]/_components/sending/fingerprint';
import { judgePart, mostTries, waitBefore } from '@/app/(organisation)/[org]/studies/[id]/_components/sending/retry-plan';
import { confirmedBytes, sentBytes } from '@/app/(organisation)/[org]/studies/[id]/_components/sending/transfer';
import { partCountOf, partSizeOf } from '@/lib/domain/uploads/part-size';

const mebibyte = 1024 * 1024;

describe('confirmed bytes', () => {
  it.each([1, 8 * mebibyte - 1, 8 * mebibyte, 8 * mebibyte + 1, 200 * mebibyte, 5e9, 50e9])('of a file of %i bytes grow part by part to its size', (bytes) => {
    const count = partCountOf(bytes, partSizeOf(bytes));
    expect(count).toBeLessThanOrEqual(900);
    const numbers: number[] = [];
    let before = 0;
    for (let number = count; number >= 1; number -= 1) {
      numbers.push(number);
      const confirmed = confirmedBytes(bytes, numbers);
      expect(confirmed).toBeGreaterThan(before);
      before = confirmed;
    }
    expect(before).toBe(bytes);
  });
  it('do not count what is on its way; the rate does, once', () => {
    const file = { size: 20 * mebibyte } as File;
    const sending = { file, stored: new Map([[1, 'a']]), inFlight: new Map([[1, 8 * mebibyte], [2, 100]]) };
    expect(confirmedBytes(file.size, sending.stored.keys())).toBe(8 * mebibyte);
    expect(sentBytes(sending)).toBe(8 * mebibyte + 100);
  });
});

describe('a part that is not stored', () => {
  it('is judged by its answer', () => {
    const judge = (status: number, isPastItsTime = false) => judgePart({ status, isPastItsTime });
    expect([judge(200), judge(403), judge(0, true), judge(0), judge(500), judge(503), judge(404)]).toEqual(['stored', 'expired', 'expired', 'again', 'again', 'again', 'gone']);
  });
  it('is tried for about two minutes, ever later, never in step', () => {
    const waits = Array.from({ length: mostTries - 1 }, (_, index) => waitBefore(index + 1, () => 1));
    expect(waits).toEqual([1000, 2000, 4000, 8000, 16_000, 30_000, 30_000]);
    expect(waitBefore(1, () => 0)).toBe(500);
  });
});

describe('the fingerprint', () => {
  it('is of the first and the last megabyte', async () => {
    const make = (at: number, value: number) => {
      const bytes = new Uint8Array(3 * mebibyte);
      bytes[at] = value;
      return fingerprintOf(new Blob([bytes]));
    };
    const plain = await make(0, 0);
    expect(plain).toMatch(/^[0-9a-f]{64}$/);
    expect(await make(0, 1)).not.toBe(plain);
    expect(await make(3 * mebibyte - 1, 1)).not.toBe(plain);
    expect(await make(1.5 * mebibyte, 1)).toBe(plain);
    expect(await fingerprintOf(new Blob(['a']))).not.toBe(await fingerprintOf(new Blob(['b'])));
  });
});
