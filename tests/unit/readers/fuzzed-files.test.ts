import { readdirSync, readFileSync } from 'node:fs';
import path from 'node:path';
import { describe, expect, it } from 'vitest';
import { tryFile } from '@/tests/fuzz/try-file';

const folder = path.join(import.meta.dirname, '../../../fixtures/fuzzed');
const files = readdirSync(folder).filter((file) => file !== 'README.md');

describe('a file that fuzzing found', () => {
  it.each(files)('%s is read or refused, the same in whatever pieces it comes', async (file) => {
    expect(await tryFile(readFileSync(path.join(folder, file)), [1, 40, 200, 1000])).toBeNull();
  });
});
