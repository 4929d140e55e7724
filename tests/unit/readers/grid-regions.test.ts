import { describe, expect, it } from 'vitest';
import type { GridReading } from '@/lib/readers/grid-reading';
import type { GridPart } from '@/lib/readers/grid-task';
import { createGridChecks } from '@/lib/readers/grid-checks';
import { readGrid } from '@/lib/readers/read-grid';
import { RejectedFile } from '@/lib/readers/rejected-file';
import type { OpenHelper } from '@/lib/readers/table/chunk-helping';
import { createTableMemory } from '@/lib/readers/table/table-memory';
import { createTableWork, type TableTask } from '@/lib/readers/table/table-work';
import { byteSource } from '@/tests/support/byte-source';

const box = [[0, 1], [0, 1], [0, 1]] as const;
const reading: GridReading = {
  mapping: { x: 'x', y: 'y', z: 'z', weight: 'w', distance: 'distance', flag: 'flag', fields: { u: 'u' } },
  problem: { dimension: 3, exact: { u: 'x+2*y*z' }, constants: {} }, fields: [{ field: 'u' }],
};
const bands: GridReading['bands'] = { distance: box, bands: [{ name: '2h', test: { by: 'thickness', thickness: 0.05 } }, { name: 'fixed', test: { by: 'flag' } }] };
const grown: GridReading['maps'] = { fields: ['u'], dimension: 3, box: null, h: null };

/** Rows in no order at all, so that classes change from row to row and ranges widen from chunk to chunk. */
function scattered(count: number, change: (row: string, index: number) => string = (row) => row): Buffer {
  const fraction = (i: number, step: number) => (i * step) % 1;
  const rows = Array.from({ length: count }, (_, i) => {
    const [x, y, z] = [fraction(i, 0.754877666), fraction(i, 0.569840291), fraction(i, 0.430159709)].map((value) => value * (0.2 + (0.8 * i) / count));
    const u = (x ?? 0) + 2 * (y ?? 0) * (z ?? 0) + 1e-3 * Math.sin(i);
    return change([x, y, z, 1 + (i % 5) / 10, u, (i % 3) / 10, i % 4 === 0 ? 1 : 0].join(','), i);
  });
  return Buffer.from(`x,y,z,w,u,distance,flag\n${rows.join('\n')}\n`);
}

/** Reads ahead in this thread as another would, with what is given to it cloned. */
function helper(reads: number[]): (task: TableTask) => OpenHelper<GridPart> {
  return (task) => (shared) => {
    const { mapRoom, ...grid } = task.grid;
    const memory = createTableMemory(shared);
    const work = createTableWork({ ...structuredClone({ ...task, grid }), grid: { ...structuredClone(grid), mapRoom } }, createGridChecks(undefined), memory);
    return Promise.resolve({
      async readAhead(room, length) {
        reads.push(room);
        await new Promise((resolve) => setTimeout(resolve, 1));
        return structuredClone(work.readAhead(memory.bytes(shared.rooms[room] as number, length)));
      },
      close: () => Promise.resolve(),
    });
  };
}

describe('readGrid(source, reading with bands and maps)', () => {
  it('comes to the same bits with and without a helping thread', async () => {
    const content = scattered(60_000);
    const reads: number[] = [];
    const asked = { ...reading, bands, maps: grown };
    const alone = await readGrid(byteSource(content), asked);
    expect(await readGrid(byteSource(content), asked, { openHelper: helper(reads) })).toEqual(alone);
    expect(reads.length).toBeGreaterThan(0);
    expect(alone.norms.regions?.map(({ region }) => region)).toEqual(['interior-2h', 'boundary-2h', 'interior-fixed', 'boundary-fixed']);
    expect(alone.maps.map(({ plane }) => plane)).toEqual(['xy', 'xz', 'yz']);
    // As many bins as rows let one hope for, around what the rows span.
    for (const { width, height, bounds, shares, largest } of alone.maps) {
      expect(Math.max(width, height)).toBeLessThanOrEqual(256);
      for (const side of Object.values(bounds)) expect(side[0]).toBeLessThanOrEqual(0);
      expect(Math.max(...shares.filter((share) => !Number.isNaN(share)))).toBe(1);
      expect(largest).toBeCloseTo(alone.norms.fields[0]?.Linf ?? 0, 9);
    }
  });

  it('takes distances from a column before those from the box, and boundary rows from their flags', async () => {
    const content = scattered(3000);
    const { norms } = await readGrid(byteSource(content), { ...reading, bands: { ...bands, distance: 'column' } });
    const count = (region: string) => norms.regions?.find((each) => each.region === region)?.rows;
    expect([count('boundary-2h'), count('interior-2h'), count('boundary-fixed'), count('interior-fixed')]).toEqual([1000, 2000, 750, 2250]);
  });

  it('a part without rows has no norms', async () => {
    const all = await readGrid(byteSource(scattered(500)), { ...reading, bands: { distance: box, bands: [{ name: 'fixed', test: { by: 'thickness', thickness: 2 } }] } });
    expect(all.norms.regions?.map(({ region }) => region)).toEqual(['boundary-fixed']);
    expect(all.norms).toEqual({ ...all.norms.regions?.[0], region: undefined, regions: all.norms.regions });
  });

  it('says of a row that cannot be taken where it stands in the file, whatever class it is of', async () => {
    const content = scattered(9000, (row, index) => (index === 7001 || index === 8002 ? row.replace(/^([^,]+,[^,]+,[^,]+),[^,]+/, '$1,-1') : row));
    const read = readGrid(byteSource(content), { ...reading, bands });
    await expect(read).rejects.toBeInstanceOf(RejectedFile);
    await expect(read).rejects.toMatchObject({ reasons: [{ code: 'weight-not-positive', line: 7003, column: 4, count: 2 }] });
  });

  it('names the column that it has not', async () => {
    const mapping = { ...reading.mapping, distance: undefined };
    await expect(readGrid(byteSource(scattered(10)), { ...reading, mapping, bands: { ...bands, distance: 'column' } })).rejects.toThrow('readGrid: the mapping has no column for distance');
  });
});
