import { describe, expect, it } from 'vitest';
import type { Region } from '@/lib/numerics/assessment';
import type { ErrorMap } from '@/lib/numerics/maps/error-map';
import type { Interval } from '@/lib/numerics/regions/bands';
import type { GridReading } from '@/lib/readers/grid-reading';
import { readGrid } from '@/lib/readers/read-grid';
import { byteSource } from '@/tests/support/byte-source';
import { readSolverFile, readSolverSet } from '@/tests/support/solver-set';

// Every expected number is computed here from the rows, one by one, by the definition of the norm or of the bin.
interface Row { x: number; y: number; w: number; error: number }

const { sin, sinh, PI: pi } = Math;
// Values of cells, and of nodes, which lie on the edges of bands and bins.
const sets = [
  { id: 'D1_laplace_orthogonal', field: 'T', exact: (x: number, y: number) => (sinh(pi * x) * sin(pi * y)) / sinh(pi) + 0.5 * x * y },
  { id: 'A1_poisson_p1_node', field: 'u', exact: (x: number, y: number) => sin(pi * x) * sin(2 * pi * y) + x * y ** 2 },
].map((set) => ({ ...set, meta: readSolverSet(set.id).meta }));

function rowsOf({ id, field, exact, meta }: (typeof sets)[number], file: string): Row[] {
  const [head = '', ...lines] = readSolverFile(id, file).toString().trim().split('\n');
  const names = head.split(',');
  return lines.map((line) => {
    const cells = line.split(',').map(Number);
    const at = (name: string) => cells[names.indexOf(name)] ?? NaN;
    return { x: at('x'), y: at('y'), w: at(meta.weight), error: at(field) - exact(at('x'), at('y')) };
  });
}

const box: readonly Interval[] = [[0, 1], [0, 1]];
const distance = ({ x, y }: Row) => Math.min(x, 1 - x, y, 1 - y);

function expectNorms(found: { L1: number; L2: number; Linf: number } | undefined, rows: readonly Row[]) {
  const weights = rows.reduce((sum, { w }) => sum + w, 0);
  const close = (value: number | undefined, expected: number) => expect((value ?? NaN) / expected).toBeCloseTo(1, 9);
  close(found?.L1, rows.reduce((sum, { w, error }) => sum + w * Math.abs(error), 0) / weights);
  close(found?.L2, Math.sqrt(rows.reduce((sum, { w, error }) => sum + w * error * error, 0) / weights));
  close(found?.Linf, Math.max(...rows.map(({ error }) => Math.abs(error))));
}

/** Rows whose error is the largest but for rounding. */
function ties(rows: readonly Row[]): number {
  const largest = Math.max(...rows.map(({ error }) => Math.abs(error)));
  return rows.filter(({ error }) => Math.abs(error) > largest * (1 - 1e-9)).length;
}

/** The map of rows binned one by one. */
function directMap(rows: readonly Row[], { width, height, bounds }: ErrorMap): (number | null)[] {
  const [[x0, x1], [y0, y1]] = [bounds.x ?? [NaN, NaN], bounds.y ?? [NaN, NaN]];
  const bins: (number | null)[] = Array.from({ length: width * height }, () => null);
  for (const { x, y, error } of rows) {
    const column = Math.min(width - 1, Math.floor(((x - x0) / (x1 - x0)) * width + 1e-6));
    const row = Math.min(height - 1, Math.floor(((y - y0) / (y1 - y0)) * height + 1e-6));
    bins[row * width + column] = Math.max(bins[row * width + column] ?? 0, Math.abs(error));
  }
  return bins;
}

const grids = sets.flatMap((set) => set.meta.grids.map(({ file, n }) => ({ set, id: set.id, file, n })));

describe.each(grids)('regions and maps of $id $file', ({ set, file, n }) => {
  const { id, field, meta } = set;
  const rows = rowsOf(set, file);
  const read = (more: Partial<GridReading>) => readGrid(byteSource(readSolverFile(id, file)), {
    mapping: { x: 'x', y: 'y', weight: meta.weight, fields: { [field]: field } },
    problem: { dimension: 2, exact: { [field]: meta.fields[field]?.exact ?? '' }, constants: {} }, fields: [{ field }], ...more,
  });
  const regionsWith = (norms: Awaited<ReturnType<typeof readGrid>>['norms']) => new Map<Region, (typeof norms)['fields'][number] | undefined>(
    (norms.regions ?? []).map(({ region, fields }) => [region, fields[0]]),
  );

  it('norms of bands and interiors equal those of their rows alone', async () => {
    const bands = { distance: box, bands: [{ name: '2h', test: { by: 'thickness', thickness: 2 / n } }, { name: 'fixed', test: { by: 'thickness', thickness: 0.2 } }] } as const;
    const { norms } = await read({ bands });
    const plain = await read({});
    const found = regionsWith(norms);
    expectNorms(found.get('boundary-2h'), rows.filter((row) => distance(row) < 2 / n + 1e-9));
    expectNorms(found.get('interior-2h'), rows.filter((row) => distance(row) > 2 / n + 1e-9));
    expectNorms(found.get('boundary-fixed'), rows.filter((row) => distance(row) <= 0.2));
    expectNorms(found.get('interior-fixed'), rows.filter((row) => distance(row) > 0.2));
    expectNorms(norms.fields[0], rows);
    if (ties(rows) === 1) expect(norms.fields[0]?.at).toEqual(plain.norms.fields[0]?.at);
    expect((norms.weightSum / plain.norms.weightSum)).toBeCloseTo(1, 14);
    expect(norms.regions?.map(({ rows: count }) => count).reduce((sum, count) => sum + count, 0)).toBe(2 * rows.length);
    expect(plain.norms.regions).toBeUndefined();
  });

  it('where no spacing is stated, a cell lies in the band by its own size', async () => {
    const bands = { distance: box, bands: [{ name: '2h', test: { by: 'weight', dimension: 2 } }] } as const;
    const found = regionsWith((await read({ bands })).norms);
    expectNorms(found.get('boundary-2h'), rows.filter((row) => distance(row) < 2 * Math.sqrt(row.w) + 1e-9));
    expectNorms(found.get('interior-2h'), rows.filter((row) => distance(row) > 2 * Math.sqrt(row.w) + 1e-9));
  });

  it.each([{ box, h: 1 / n, name: 'the box, h stated' }, { box, h: null, name: 'the box' }, { box: null, h: null, name: 'the rows' }])('maps from $name equal rows binned one by one', async ({ box: given, h }) => {
    const { maps: [map] } = await read({ maps: { fields: [field], dimension: 2, box: given, h } });
    expect(map).toMatchObject({ field, plane: 'xy' });
    if (map === undefined) return;
    // One cell a bin where its size is stated; else powers of two, and no holes.
    const side = h === null ? 2 ** Math.floor(Math.log2(n * 1.1)) : n;
    if (given) expect([map.width, map.height]).toEqual([side, side]);
    else expect(map.width).toBeGreaterThanOrEqual(n / 2);
    const expected = directMap(rows, map);
    expect(map.largest / Math.max(...rows.map(({ error }) => Math.abs(error)))).toBeCloseTo(1, 6);
    const drawn = [...map.shares].map((share) => (Number.isNaN(share) ? null : share * map.largest));
    expect(drawn.map((value) => value === null)).toEqual(expected.map((value) => value === null));
    expect(Math.max(...drawn.map((value, bin) => Math.abs((value ?? 0) - (expected[bin] ?? 0))))).toBeLessThanOrEqual(2e-7 * map.largest);
  });
});
