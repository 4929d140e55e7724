import { writeHdf5Json } from '@/tests/support/hdf5-json';
import { upTo, type Random } from '@/tests/support/random';
import { anyColumns, anyRecords } from './documents';
import { anyHdf5 } from './hdf5';
import { anyTable } from './tables';
import { anyVtk } from './vtk';

function anyHdf5Json(random: Random): Buffer {
  const rows = upTo(random, 30);
  const list = () => Array.from({ length: rows }, () => random());
  const points = Array.from({ length: rows }, () => [random(), random()]);
  const datasets = [{ path: 'x', value: list() }, { path: 'w', value: list().map(() => 1) }, { path: 'fields/u', value: list() }, { path: 'mesh/points', dims: [rows, 2], value: points }];
  return Buffer.from(writeHdf5Json(datasets, { linksLast: random() < 0.5, noLinks: random() < 0.1, soft: { link: '/fields/u' } }));
}

/** What the fuzzed files of each reader begin as. */
export const seeds: Readonly<Record<string, (random: Random) => Buffer | Promise<Buffer>>> = {
  table: anyTable, columns: anyColumns, records: anyRecords, 'hdf5-json': anyHdf5Json, vtk: anyVtk, hdf5: anyHdf5,
};
