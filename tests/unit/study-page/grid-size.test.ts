import { describe, expect, it } from 'vitest';
import { cellCount } from '@/lib/domain/studies/cell-count';
import { gridSize } from '@/app/(organisation)/[org]/studies/[id]/_components/grid-size';

describe('the size of a grid', () => {
  it('is printed as it was stated', () => {
    expect(gridSize({ cellsPerDirection: 8 }, 2)).toBe('8\u00a0×\u00a08 cells');
    expect(gridSize({ cellsPerDirection: [16, 8] }, 2)).toBe('16\u00a0×\u00a08 cells');
    expect(gridSize({ cells: 16384 }, 2)).toBe('16\u202f384 cells');
    expect(gridSize({ h: 0.125 }, 2)).toBe('h 1/8');
    expect(gridSize({}, 2)).toBeNull();
  });

  it('counts cells in all directions', () => {
    expect(cellCount({ cellsPerDirection: 8 }, 3)).toBe(512);
    expect(cellCount({ cellsPerDirection: [16, 8] }, 2)).toBe(128);
    expect(cellCount({}, 2)).toBeNull();
  });
});
