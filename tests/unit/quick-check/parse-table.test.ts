import { describe, expect, it } from 'vitest';
import { parsePasted, readNumber } from '@/app/_components/quick-check/parse-table';

describe('parsePasted(text)', () => {
  it.each([
    ['tab', '18000\t6.063\n8000\t5.972'],
    ['semicolon', '18000;6,063\n8000;5,972'],
    ['comma', '18000,6.063\n8000,5.972'],
    ['space', '  18000  6.063\n 8000 5.972\n'],
    ['space', '18000 6,063\n8000 5,972'],
  ])('reads rows apart by %s', (separator, text) => {
    const table = parsePasted(text);
    expect(table?.separator).toBe(separator);
    expect(table?.rows.map((row) => row.map(readNumber))).toEqual([[18000, 6.063], [8000, 5.972]]);
  });

  it('leaves out a line of names and comment lines', () => {
    expect(parsePasted('# run 4\ncells,value\n16,1.5\n32,1.25')).toEqual({ rows: [['16', '1.5'], ['32', '1.25']], separator: 'comma', hadHeader: true });
  });

  it('is null for a single value, which is pasted as it is', () => {
    expect(parsePasted('6.063')).toBeNull();
  });
});

describe('readNumber(text)', () => {
  it.each([['1,5', 1.5], ['2.0D-3', 0.002], ['−4', -4], ['10 240', 10240], ['.5', 0.5]])('reads %s as %d', (text, value) => {
    expect(readNumber(text)).toBe(value);
  });

  it.each(['', '1.2.3', '12 cm', '0x10', 'nan', '1e999'])('is null for “%s”', (text) => {
    expect(readNumber(text)).toBeNull();
  });
});
