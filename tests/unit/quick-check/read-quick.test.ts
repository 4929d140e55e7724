import { describe, expect, it } from 'vitest';
import { emptyQuick, withEmptyRow } from '@/app/_components/quick-check/quick-state';
import { readQuick } from '@/app/_components/quick-check/read-quick';

const rows = (table: string[][]) => withEmptyRow(table, table[0]?.length ?? 2);

describe('readQuick(state)', () => {
  it('gives the figures of the first column of Celik et al. 2008, table 1', () => {
    const state = { ...emptyQuick, spacingAs: 'cells' as const, dimension: '2' as const, rows: rows([['18000', '6.063'], ['8000', '5.972'], ['4500', '5.863']]) };
    const [quantity] = readQuick(state).assessment?.quantities ?? [];
    expect(quantity?.orderObserved).toBeCloseTo(1.53, 2);
    expect(quantity?.extrapolated).toBeCloseTo(6.1685, 3);
    expect(quantity?.gci).toBeCloseTo(0.022, 3);
  });

  it('names the cell that holds no number', () => {
    const reading = readQuick({ ...emptyQuick, rows: rows([['16', '1.5'], ['32', '1.2x'], ['64', '']]) });
    expect(reading.assessment).toBeNull();
    expect(reading.cells).toEqual([
      { row: 1, column: 1, message: 'Not a number. Found “1.2x”.' },
      { row: 2, column: 1, message: 'Missing. Expected a number.' },
    ]);
  });

  it('judges errors of the norms that are there', () => {
    const state = { ...emptyQuick, holds: 'errors' as const, formalOrder: '2', rows: rows([['8', '', '0.04', ''], ['16', '', '0.01', ''], ['32', '', '0.0025', ''], ['64', '', '0.000625', '']]) };
    const { assessment } = readQuick(state);
    expect(assessment?.fields.map(({ norm, outcome }) => [norm, outcome])).toEqual([['L2', 'pass']]);
  });

  it('calls the finest grid 1, in whatever order the rows stand', () => {
    expect(readQuick({ ...emptyQuick, rows: rows([['16', '1.5'], ['64', '1.2'], ['32', '1.3']]) }).labels).toEqual(['3', '1', '2', '']);
    expect(readQuick({ ...emptyQuick, spacingAs: 'h', rows: rows([['0.1', '1.5'], ['0.05', '1.2']]) }).labels).toEqual(['2', '1', '']);
  });

  it('says nothing before two rows are typed', () => {
    expect(readQuick({ ...emptyQuick, rows: rows([['16', '1.5']]) })).toMatchObject({ assessment: null, cells: [], table: [] });
  });
});
