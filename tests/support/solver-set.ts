import fs from 'node:fs';
import path from 'node:path';
import { gunzipSync } from 'node:zlib';

const folder = path.join(import.meta.dirname, '../../fixtures/solver-output');

type PerNorm<Value> = Record<'L1' | 'L2' | 'Linf', Value>;
export interface SetMeta {
  id: string; title: string; dimension: 1 | 2 | 3; domain: Record<string, [number, number]>; time: number | null; parameters: Record<string, number>;
  weight: string; N_basis: 'rows' | 'elements';
  fields: Record<string, { exact: string; formal_order: PerNorm<number>; expected_outcome: PerNorm<{ outcome: string; reason: string }> }>;
  grids: { file: string; rows: number; n: number; elements?: number; dt?: number }[];
}
export interface SetExpected {
  grids: { file: string; N_rows: number; V: number; fields: Record<string, PerNorm<number> & { mean_error: number; exact_L2: number }> }[];
}

const readJson = <T>(file: string) => JSON.parse(fs.readFileSync(file, 'utf8')) as T;

/** A series of grids as a solver wrote it, with what an independent script found in it. */
export function readSolverSet(id: string): { meta: SetMeta; expected: SetExpected } {
  return { meta: readJson<SetMeta>(path.join(folder, id, 'meta.json')), expected: readJson<SetExpected>(path.join(folder, id, 'expected.json')) };
}

/** The bytes of one file, plain. */
export function readSolverFile(id: string, file: string): Buffer {
  const plain = path.join(folder, id, file);
  return fs.existsSync(plain) ? fs.readFileSync(plain) : gunzipSync(fs.readFileSync(`${plain}.gz`));
}

/** The rows of a table of quantities, coarse to fine. */
export function readQuantityTable(id: string): Record<string, string>[] {
  const [head = '', ...lines] = fs.readFileSync(path.join(folder, id, 'table.csv'), 'utf8').trim().split('\n');
  const names = head.split(',');
  return lines.map((line) => Object.fromEntries(line.split(',').map((value, index) => [names[index] ?? '', value])));
}

/** What is wrong with each damaged file, by whoever damaged it. */
export function readBrokenFiles(): { file: string; line: number | null; column: number | null }[] {
  return readJson(path.join(folder, 'broken/broken.json'));
}

interface Triplet { convergence: string; p: number }

/** Triplets of every quantity of such a table, from the coarsest to the finest, by an independent script. */
export function readTriplets(id: string): Record<string, Triplet[]> {
  const { qoi } = readJson<{ qoi: Record<string, { triplets: Triplet[] }> }>(path.join(folder, id, 'expected.json'));
  return Object.fromEntries(Object.entries(qoi).map(([name, { triplets }]) => [name, triplets]));
}
