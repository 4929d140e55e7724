import { createReadStream, existsSync, readFileSync } from 'node:fs';
import { describe, expect, it } from 'vitest';
import type { FieldNorms } from '@/lib/numerics/norms/grid-norms';
import { readGrid } from '@/lib/readers/read-grid';

// Expected norms were computed by an independent script from the same files (fixtures/solver-output/README.md).
const folder = 'fixtures/solver-output';
const sets = [
  'A1_poisson_p1_node', 'C1_tgv_grid', 'D1_laplace_orthogonal', 'D2_laplace_nonorth_corrected',
  'D3_laplace_nonorth_uncorrected', 'F1_plateau', 'F2_source_bug', 'G1_formats',
];

interface Meta {
  time: number | null;
  parameters: Record<string, number>;
  weight: string;
  fields: Record<string, { exact: string }>;
  grids: { file: string; rows: number }[];
}
interface ExpectedField {
  L1: number; L2: number; Linf: number; Linf_location: { x: number; y: number }; Linf_ties: number; mean_error: number; exact_L2: number;
}
interface Expected { grids: { file: string; N_rows: number; V: number; fields: Record<string, ExpectedField> }[] }

function readJson<T>(path: string): T {
  return JSON.parse(readFileSync(path, 'utf8')) as T;
}

function expectWithin(found: number, expected: number, scale = Math.abs(expected)) {
  expect(Math.abs(found - expected)).toBeLessThanOrEqual(1e-9 * scale);
}

function expectSame(found: FieldNorms, expected: ExpectedField) {
  expectWithin(found.L1, expected.L1);
  expectWithin(found.L2, expected.L2);
  expectWithin(found.Linf, expected.Linf);
  expectWithin(found.mean, expected.mean_error, expected.L1);
  expectWithin(found.exact.L2, expected.exact_L2);
  if (expected.Linf_ties === 1) expect(found.at).toEqual(expected.Linf_location);
}

describe.each(sets)('norms of %s equal those of an independent script to 1e-9', (set) => {
  const meta = readJson<Meta>(`${folder}/${set}/meta.json`);
  const expected = readJson<Expected>(`${folder}/${set}/expected.json`);
  const fields = Object.keys(meta.fields);

  it.each(expected.grids.map((grid) => ({ ...grid })))('$file', async (grid) => {
    const plain = `${folder}/${set}/${grid.file}`;
    const result = await readGrid(createReadStream(existsSync(plain) ? plain : `${plain}.gz`), {
      mapping: { x: 'x', y: 'y', weight: meta.weight, fields: Object.fromEntries(fields.map((name) => [name, name])) },
      problem: {
        dimension: 2, constants: meta.parameters,
        exact: Object.fromEntries(fields.map((name) => [name, meta.fields[name]?.exact ?? ''])),
      },
      fields: fields.map((field) => ({ field })),
      t: meta.time ?? undefined,
    });
    expect(result.norms.rows).toBe(grid.N_rows);
    expectWithin(result.norms.weightSum, grid.V);
    for (const found of result.norms.fields) expectSame(found, grid.fields[found.field] as ExpectedField);
  });
});
