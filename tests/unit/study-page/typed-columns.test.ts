import { describe, expect, it } from 'vitest';
import { readCells, typedText, type TypedColumn } from '@/app/(organisation)/[org]/studies/[id]/_components/typed-columns';
import type { Grid } from '@/lib/domain/studies/schema';

const columns: TypedColumn[] = [{ kind: 'value', name: 'drag', unit: 'N' }, { kind: 'error', field: 'u', norm: 'L2' }];
const grid: Grid = { label: 'g1', state: 'typed', revision: 1, excluded: null, afterData: false, upload: null };

describe('typed values', () => {
  it('keep a trailing zero as their resolution, and give it back as it was typed', () => {
    const read = readCells(columns, ['6.0420', '1,5e-3']);
    expect(read).toEqual({ ok: true, change: { values: { drag: { value: 6.042, resolution: 1e-4 } }, errors: { u: { L2: 1.5e-3 } } } });
    expect(typedText({ ...grid, values: { drag: { value: 6.042, resolution: 1e-4 } } }, columns[0] ?? { kind: 'value', name: '', unit: null })).toBe('6.0420');
    expect(readCells(columns, ['6.042', ''])).toEqual({ ok: true, change: { values: { drag: 6.042 }, errors: {} } });
  });

  it('name the first cell that is no number, and refuse a negative error', () => {
    expect(readCells(columns, ['0,1x', ''])).toEqual({ ok: false, column: 0, found: '0,1x' });
    expect(readCells(columns, ['', '-1'])).toEqual({ ok: false, column: 1, found: '-1' });
  });
});
