import { describe, expect, it } from 'vitest';
import { isStorable } from '@/lib/domain/api/storable-text';

describe('isStorable', () => {
  it.each(['', 'Brack', 'Übergröße 中文 𝛁 ☃', 'a\nb\tc', '\u0007'])('takes %j', (text) => {
    expect(isStorable(text)).toBe(true);
  });
  it.each(['a\0b', '\ud800', 'a\udc00b'])('refuses %j', (text) => {
    expect(isStorable(text)).toBe(false);
  });
});
