import { describe, expect, it } from 'vitest';
import { studySeries } from '@/lib/domain/assessment/study-series';
import type { StudyGrid } from '@/lib/domain/assessment/study-to-assess';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import type { GridInput } from '@/lib/domain/studies/input';

const definition = caseDefinitionSchema.parse({
  fields: [{ field: 'u', norms: [{ norm: 'L2', formalOrder: 2 }, { norm: 'Linf', formalOrder: 2, counts: false, reference: 9 }] }],
  quantities: [{ name: 'drag', unit: 'N', formalOrder: 2, target: 0.01 }, { name: 'flux', formalOrder: 2, knownValue: -2 }],
});
const around = { refinement: 'space', dimension: 2, volume: 1 } as const;

/** A grid whose file had values up to 8 printed with the digits given, and an exact field up to 4. */
function read(grid: GridInput, significantDigits: number | null = 6): StudyGrid {
  const exact = { L1: 2, L2: 3, Linf: 4 };
  const column = { field: 'u', L1: 0.1, L2: 0.2, Linf: 0.3, at: { x: 0.5, y: 0.25 }, mean: 0, exact, min: -8, max: 1, maxAbs: 8, count: 4, significantDigits };
  return { grid, norms: { rows: 4, weightSum: 1, equalWeights: false, fields: [column] } };
}
const typed = (grid: GridInput): StudyGrid => ({ grid, norms: null });
const made = (grids: StudyGrid[], more: Partial<Parameters<typeof studySeries>[0]> = {}) => {
  const series = studySeries({ definition, grids, ...around, ...more });
  if (!series.ok) throw new Error(series.reason);
  return series;
};

describe('studySeries', () => {
  it('has a series for every field and norm and every quantity declared, with errors from the files', () => {
    const { errors, quantities } = made([read({ label: 'a', cells: 16 }), read({ label: 'b', cells: 64 })]);
    expect(errors.map(({ field, norm, counts }) => [field, norm, counts])).toEqual([['u', 'L2', true], ['u', 'Linf', false], ['flux', 'value', true]]);
    expect(quantities.map(({ name, unit, target }) => [name, unit, target])).toEqual([['drag', 'N', 0.01]]);
    expect(errors[0]?.grids.map(({ label, h, error, exactNorm }) => [label, h, error, exactNorm])).toEqual([['b', 0.125, 0.2, 3], ['a', 0.25, 0.2, 3]]);
  });

  it('finds the known error from the most digits seen over all grids, and adds the iterative one', () => {
    const { errors } = made([
      read({ label: 'a', cells: 16 }, 3), read({ label: 'b', cells: 64, iterativeError: { u: { L2: 1e-3 } } }, 6),
    ]);
    // Half a unit of the sixth digit of 8: ½·10^(0 − 6 + 1).
    const half = 0.5e-5;
    const [fine, coarse] = errors[0]?.grids ?? [];
    expect([fine?.knownError, coarse?.knownError]).toEqual([expect.closeTo(half + 1e-3, 12), expect.closeTo(half, 12)]);
  });

  it('takes half a unit of float32 where the run says single', () => {
    const { errors } = made([read({ label: 'a', cells: 16, run: { precision: 'single' } }, 17), read({ label: 'b', cells: 64 }, 17)]);
    expect(errors[0]?.precision).toBe('single');
    expect(errors[0]?.grids.find(({ label }) => label === 'a')?.knownError).toBe(0.5 * 2 ** (3 - 23));
  });

  it('takes half a unit of float32 where the file stores the column so', () => {
    const { grid, norms } = read({ label: 'a', cells: 16 }, 3);
    if (!norms) throw new Error('norms were made');
    const { errors } = made([{ grid, norms: { ...norms, fields: norms.fields.map((field) => ({ ...field, significantDigits: null, storedAs: 'single' as const })) } }]);
    expect(errors[0]).toMatchObject({ precision: 'single', grids: [{ knownError: 0.5 * 2 ** (3 - 23) }] });
  });

  it('has the largest exact value or the stated reference for scale, none where errors are typed', () => {
    const { errors } = made([read({ label: 'a', cells: 16 })]);
    expect(errors.map(({ scale }) => scale)).toEqual([4, 9, 2]);
    const withTyped = made([typed({ label: 'a', h: 0.1, errors: { u: { L2: 0.2 } }, iterativeError: { u: { L2: 0.01 } } })]);
    expect(withTyped.errors[0]).toMatchObject({ scale: null, grids: [{ error: 0.2, knownError: 0.01, exactNorm: null, at: null }] });
  });

  it('says where the largest error lies only for L∞', () => {
    const { errors } = made([read({ label: 'a', cells: 16 })]);
    expect(errors.slice(0, 2).map(({ grids }) => grids[0]?.at)).toEqual([null, { x: 0.5, y: 0.25 }]);
  });

  it('asks for as many grids as the case, else as the rule: four for errors, three for quantities', () => {
    const { errors, quantities } = made([read({ label: 'a', cells: 16 })]);
    expect([errors[0]?.minimumGrids, errors[2]?.minimumGrids, quantities[0]?.minimumGrids]).toEqual([4, 4, 3]);
    const stricter = made([read({ label: 'a', cells: 16 })], { definition: { ...definition, minimumGrids: 5 } });
    expect([stricter.errors[0]?.minimumGrids, stricter.quantities[0]?.minimumGrids]).toEqual([5, 5]);
  });

  it('judges a quantity of known value by its error', () => {
    const { errors } = made([typed({ label: 'a', h: 0.1, values: { flux: { value: -1.5, resolution: 0.1 }, drag: 3 } })]);
    expect(errors[2]).toMatchObject({ field: 'flux', scale: 2, grids: [{ error: 0.5, knownError: 0.05 }] });
  });

  it('reads the spacing off the weights of the files where nothing is stated, and says so where it cannot', () => {
    const coarse = read({ label: 'a' });
    const { errors } = made([coarse]);
    expect(errors[0]?.grids[0]?.h).toBe(0.5);
    const equal = { ...coarse, norms: coarse.norms && { ...coarse.norms, equalWeights: true, weightSum: 4 } };
    expect(studySeries({ definition, grids: [equal], ...around })).toMatchObject({ ok: false, reason: expect.stringContaining('Grid a:') as string });
  });
});
