import { createHash } from 'node:crypto';
import { describe, expect, it } from 'vitest';
import { partCountOf, partSizeOf } from '@/lib/domain/uploads/part-size';
import { readReprDigest } from '@/lib/domain/uploads/repr-digest';

const mebibyte = 1024 * 1024;

describe('partSizeOf', () => {
  it('is 8 MiB up to 900 parts, then whole MiB', () => {
    expect(partSizeOf(1)).toBe(8 * mebibyte);
    expect(partSizeOf(7200 * mebibyte)).toBe(8 * mebibyte);
    expect(partSizeOf(7200 * mebibyte + 1)).toBe(9 * mebibyte);
    expect(partCountOf(50e9, partSizeOf(50e9))).toBeLessThanOrEqual(900);
  });
});

describe('readReprDigest', () => {
  it('gives the SHA-256 of the field in hexadecimal', () => {
    // RFC 9530, section 3: the digest of {"hello": "world"} with a line feed.
    const hash = createHash('sha256').update('{"hello": "world"}\n');
    expect(readReprDigest('sha-256=:RK/0qy18MlBSVnWgjwz6lZEWjP/lF5HF9bvEF8FabDg=:')).toBe(hash.digest('hex'));
  });

  it('passes over other algorithms and finds it among several', () => {
    expect(readReprDigest('sha-512=:AAAA:')).toBeNull();
    expect(readReprDigest('md5=:AAAA:, SHA-256=:RK/0qy18MlBSVnWgjwz6lZEWjP/lF5HF9bvEF8FabDg=:')).toHaveLength(64);
  });

  it('refuses what is no digest', () => {
    expect(() => readReprDigest('sha-256=abc')).toThrow('sha-256=abc');
  });
});
