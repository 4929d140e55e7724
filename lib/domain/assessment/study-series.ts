import { regions, type ErrorSeries, type Norm, type QuantitySeries, type Region } from '@/lib/numerics/assessment';
import { knownError } from '@/lib/numerics/norms/known-error';
import { errorSeriesOfQuantity } from '@/lib/numerics/outcome/error-series-of-quantity';
import { resolveSpacing } from '@/lib/numerics/spacing/resolve-spacing';
import { differencesOf } from './difference-series';
import type { CaseDefinition, DeclaredField, DeclaredNorm, DeclaredQuantity } from '../cases/definition';
import { lacksQuadrature, orderOfElements, withElementOrders } from '../cases/element-orders';
import { builtInRule } from '../rules/built-in-rule';
import { refinedSpace, studySimilarity } from './mesh-of-study';
import { statedSpacing } from '../studies/stated-spacing';
import type { GridDifference, PlacedGrid, StudySeries, StudyToAssess } from './study-to-assess';

/** Series of every declared field and norm and of every quantity; or in words why the grids cannot be put in a row. */
export function studySeries({ definition: stated, grids, differences = [], ...around }: StudyToAssess): StudySeries {
  const definition = withElementOrders(stated);
  const { thin, ...space } = refinedSpace(grids, around);
  const spacing = resolveSpacing({ grids: grids.map(({ grid, norms }) => statedSpacing(grid, norms, thin)), refinement: around.refinement, ...space });
  if (!spacing.ok) {
    const told = spacing.problems.map(({ label, found, expected }) => `${label === null ? 'The grids' : `Grid ${label}`}: ${found}; expected ${expected}.`);
    return { ok: false, reason: told.join(' ') };
  }
  const placed = spacing.grids.flatMap(({ index, h }) => {
    const one = grids[index];
    return one ? [{ ...one, h }] : [];
  });
  const known = definition.quantities.filter(({ knownValue }) => knownValue !== undefined);
  const unknown = definition.quantities.filter(({ knownValue }) => knownValue === undefined);
  return {
    ok: true,
    errors: [
      ...definition.fields.flatMap((field) => field.norms.flatMap((norm) => fieldSeries({ definition, differences, ...around }, { field, norm }, placed))),
      ...known.map((quantity) => ({
        ...errorSeriesOfQuantity(quantitySeries(quantity, placed, 0), quantity.knownValue ?? 0),
        minimumGrids: definition.minimumGrids ?? builtInRule.minimumGrids,
      })),
      ...placedByRegion(placed).flatMap(({ region, placed: parts }) => definition.fields.flatMap((field) => field.norms.flatMap((norm) => (
        fieldSeries({ definition, differences: [], ...around }, { field, norm }, parts).flatMap((series) => (series.grids.length === 0 ? [] : { ...series, region, counts: false }))
      )))),
    ],
    similarity: around.refinement === 'space' ? studySimilarity(definition, placed, around) : null,
    around: { box: around.box, means: placed.flatMap(({ grid, norms }) => (norms?.fields ?? []).map(({ field, mean }) => ({ field, label: grid.label, mean }))) },
    quantities: unknown.map((quantity) => quantitySeries(quantity, placed, definition.minimumGrids ?? builtInRule.minimumGridsOfQuantity)),
  };
}

/** Grids with the norms of each part of the domain that some grid has rows in, in the place of those of the whole. */
function placedByRegion(placed: readonly PlacedGrid[]): { region: Region; placed: PlacedGrid[] }[] {
  return regions.flatMap((region) => {
    const parts = placed.flatMap(({ grid, norms, h }): PlacedGrid[] => {
      const own = norms?.regions?.find((part) => part.region === region);
      // What was typed is an error of the whole.
      return own ? [{ grid: { ...grid, errors: undefined }, norms: own, h }] : [];
    });
    return parts.length === 0 ? [] : [{ region, placed: parts }];
  });
}

function fieldSeries({ definition, dimension, volume, differences }: Pick<StudyToAssess, 'definition' | 'dimension' | 'volume'> & { differences: readonly GridDifference[] }, { field, norm }: { field: DeclaredField; norm: DeclaredNorm }, placed: readonly PlacedGrid[]): ErrorSeries[] {
  const { norm: name } = norm;
  const columns = placed.flatMap(({ norms }) => norms?.fields.find((column) => column.field === field.field) ?? []);
  const solutions = placed.flatMap(({ norms }) => norms?.solutions?.find((solution) => solution.field === field.field) ?? []);
  const significantDigits = largestOf([...columns, ...solutions].flatMap((column) => column.significantDigits ?? []));
  const compared = differencesOf(differences, placed, { field: field.field, norm: name, significantDigits });
  const formalOrder = norm.formalOrder ?? null;
  return [{
    field: field.field, norm: name,
    ...(compared ?? { grids: placed.flatMap((one) => gridError(one, field.field, { norm: name, significantDigits }) ?? []) }),
    formalOrder, regularity: norm.regularity ?? null,
    logFactor: norm.logFactor === undefined ? null : { power: norm.logFactor, length: volume === null ? 1 : volume ** (1 / dimension) },
    derivedOrder: norm.derivedOrder ?? null, tolerance: norm.tolerance ?? null, counts: norm.counts,
    expectExact: norm.expectExact, exactLimit: norm.exactLimit ?? null,
    scale: largestOf([...columns.map((column) => column.exact.Linf), ...(compared?.scale ? [compared.scale] : []), ...(norm.reference === undefined ? [] : [norm.reference])]),
    precision: placed.some(({ grid }) => grid.run?.precision === 'single') || columns.some(({ storedAs }) => storedAs === 'single') ? 'single' : 'double',
    minimumGrids: definition.minimumGrids ?? builtInRule.minimumGrids,
    samplingStated: definition.sampling !== undefined, ...ofElements(definition, field, norm),
  }];
}

function ofElements(definition: CaseDefinition, field: DeclaredField, norm: DeclaredNorm): Pick<ErrorSeries, 'elements'> {
  const order = orderOfElements(definition, field, norm);
  return definition.elements && order !== null ? { elements: { degree: definition.elements.degree, order, atQuadrature: !lacksQuadrature(definition, field, norm) } } : {};
}

/** What was read from a file goes before what was typed. */
export function gridError({ grid, norms, h }: PlacedGrid, field: string, { norm, significantDigits }: { norm: Norm; significantDigits: number | null }): ErrorSeries['grids'][number] | null {
  const iterativeError = grid.iterativeError?.[field]?.[norm] ?? 0;
  const column = norms?.fields.find((candidate) => candidate.field === field);
  if (norm === 'H1' || norm === 'energy') {
    const gradient = norms?.gradients?.find((candidate) => candidate.field === field);
    const stored = gradient && { largest: gradient.maxAbs, significantDigits: gradient.significantDigits, precision: gradient.storedAs ?? grid.run?.precision };
    if (stored) return { label: grid.label, h, error: gradient.H1, knownError: knownError(stored, iterativeError), exactNorm: gradient.exactH1, at: null };
  } else if (column) {
    const stored = { largest: column.maxAbs, significantDigits, precision: column.storedAs ?? grid.run?.precision };
    return {
      label: grid.label, h, error: column[norm], knownError: knownError(stored, iterativeError), exactNorm: column.exact[norm],
      at: norm === 'Linf' ? column.at : null,
    };
  }
  const error = grid.errors?.[field]?.[norm];
  return error === undefined ? null : { label: grid.label, h, error, knownError: iterativeError, exactNorm: null, at: null };
}

export function quantitySeries({ name, unit, formalOrder, target, procedure, uNumFactor }: DeclaredQuantity, placed: readonly PlacedGrid[], minimumGrids: number): QuantitySeries {
  return {
    name, unit: unit ?? null, formalOrder: formalOrder ?? null, target: target ?? null, minimumGrids, procedure, uNumFactor: uNumFactor ?? null,
    grids: placed.flatMap(({ grid: { label, values }, h }) => {
      const stated = values?.[name];
      if (stated === undefined) return [];
      return [typeof stated === 'number' ? { label, h, value: stated, resolution: null } : { label, h, ...stated, resolution: stated.resolution ?? null }];
    }),
  };
}

function largestOf(numbers: readonly number[]): number | null {
  return numbers.length === 0 ? null : Math.max(...numbers);
}
