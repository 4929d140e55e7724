import { describe, expect, it } from 'vitest';
import { keepRecent, transferRate, type Sample } from '@/app/(organisation)/[org]/studies/[id]/_components/sending/transfer-rate';
import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import { formatSeconds } from '@/lib/domain/numbers/format-seconds';

describe('the rate of a transfer', () => {
  it('is that of the last seconds', () => {
    let samples: Sample[] = [];
    for (let second = 0; second <= 20; second += 1) samples = keepRecent(samples, { at: second * 1000, bytes: second < 10 ? second * 1e6 : 10e6 + (second - 10) * 5e6 });
    expect(transferRate(samples)).toBe(5e6);
  });

  it('is not told from a moment, nor after bytes were lost', () => {
    expect(transferRate([{ at: 0, bytes: 0 }, { at: 100, bytes: 5e6 }])).toBeNull();
    expect(transferRate(keepRecent([{ at: 0, bytes: 5e6 }], { at: 1000, bytes: 1e6 }))).toBeNull();
  });
});

describe('sizes and times', () => {
  it('are printed with the digits that matter', () => {
    expect([999, 41_230, 1_640_000, 318_000_000].map(formatBytes)).toEqual(['999\u00a0B', '41\u00a0kB', '1.6\u00a0MB', '318\u00a0MB']);
    expect([0.2, 8, 185, 4800].map(formatSeconds)).toEqual(['1\u00a0s', '8\u00a0s', '3\u00a0min', '1\u00a0h 20\u00a0min']);
  });
});
