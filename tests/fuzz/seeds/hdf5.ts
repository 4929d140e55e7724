import { writeHdf5 } from '@/tests/support/hdf5';
import { oneOf, type Random } from '@/tests/support/random';

const rows = 400;
const doubles = (of: (row: number) => number) => Float64Array.from({ length: rows }, (_, row) => of(row));
const [x, u, w] = [doubles((row) => row / rows), doubles(Math.sin), doubles(() => 1)];

// The library writes no two files alike at will, so there are a few; most of what can go wrong stands in their beginning.
const files = [
  await writeHdf5([{ path: 'x', data: x }, { path: 'u', data: u }, { path: 'w', data: w }]),
  await writeHdf5([{ path: 'mesh/x', data: x, chunks: [70], compression: 6 }, { path: 'fields/u', data: Float32Array.from(u), chunks: [400] }, { path: 'w', data: w }]),
  await writeHdf5([{ path: 'x', data: x, shape: [20, 20], chunks: [3, 7], compression: 9 }, { path: 'u', data: u, shape: [20, 20] }, { path: 'w', data: w }]),
  await writeHdf5([{ path: 'a/b/points', data: new Map<string, unknown>([['x', x], ['u', u], ['w', Int32Array.from(w)]]) }], (file) => {
    file.create_soft_link('/a/b/points', 'soft');
    file.create_hard_link('/', 'a/round');
  }),
];

export const anyHdf5 = (random: Random): Buffer => oneOf(random, files);
