import { describe, expect, it } from 'vitest';
import { findJsonExcess, jsonBounds } from '@/lib/domain/api/json-bounds';

const excessOf = (text: string) => findJsonExcess(Buffer.from(text));
const nested = (depth: number) => `${'['.repeat(depth)}${']'.repeat(depth)}`;

describe('findJsonExcess(bytes)', () => {
  it('is null up to each bound', () => {
    expect(excessOf(nested(jsonBounds.depth))).toBeNull();
    expect(excessOf(JSON.stringify('a'.repeat(jsonBounds.text)))).toBeNull();
    expect(excessOf(JSON.stringify(Array(jsonBounds.members).fill(0)))).toBeNull();
    expect(excessOf('')).toBeNull();
  });

  it('names the bound that is passed and the byte', () => {
    expect(excessOf(nested(jsonBounds.depth + 1))).toEqual({ what: 'depth', byte: jsonBounds.depth + 1 });
    expect(excessOf(`{"a":"${'a'.repeat(jsonBounds.text + 1)}"}`)).toEqual({ what: 'text', byte: 6 });
    expect(excessOf(JSON.stringify(Array(jsonBounds.members + 1).fill(0)))?.what).toBe('members');
    expect(excessOf('{}'.repeat(jsonBounds.members + 1))?.what).toBe('members');
  });

  it('takes what stands in texts for text', () => {
    expect(excessOf(JSON.stringify({ a: `${nested(100)}"\\`, b: '{'.repeat(99), c: '\\' }))).toBeNull();
    expect(excessOf('"open')).toBeNull();
  });
});
