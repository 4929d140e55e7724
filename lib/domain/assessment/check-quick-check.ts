import type { FieldProblem } from '@/lib/errors';
import { repeated } from '../cases/repeated';
import { quickCheckNorms } from './quick-check-series';
import type { QuickCheckInput } from './quick-schema';

/** What is wrong with the table but for its spacings: every fault with the path of its member. */
export function checkQuickCheck(input: QuickCheckInput): FieldProblem[] {
  const { grids, dimension } = input;
  const isQuantity = grids.some((grid) => grid.value !== undefined);
  return [
    ...repeated(grids.map((grid, index) => grid.label ?? String(index + 1)), (index) => `grids.${index}.label`, 'Grid'),
    ...grids.flatMap(({ cellsPerDirection }, index) => (
      Array.isArray(cellsPerDirection) && cellsPerDirection.length !== dimension
        ? [{ path: `grids.${index}.cellsPerDirection`, message: `Found ${cellsPerDirection.length} counts. Expected ${dimension}, one for each direction.` }] : []
    )),
    ...(isQuantity ? checkQuantity(input) : checkErrors(input)),
    ...checkOrders(input),
  ];
}

function checkQuantity(input: QuickCheckInput): FieldProblem[] {
  const { grids, knownValue, target, procedure, formalOrder, uNumFactor } = input;
  const faults = grids.flatMap((grid, index): FieldProblem[] => [
    ...(grid.value === undefined ? [{ path: `grids.${index}.value`, message: 'Other grids have a value. Expected one here too.' }] : []),
    ...(grid.errors === undefined ? [] : [{ path: `grids.${index}.errors`, message: 'Expected a value or errors, not both.' }]),
    ...(grid.iterativeError === undefined ? [] : [{ path: `grids.${index}.iterativeError`, message: 'An iterative error goes with errors. State the resolution of the value.' }]),
  ]);
  for (const member of ['formalOrder', 'tolerance'] as const) {
    if (typeof input[member] === 'object') faults.push({ path: member, message: 'A quantity has no norms. Expected one number.' });
  }
  const needsOrder = procedure === 'guarded-order' || procedure === 'correction-factor';
  if (needsOrder && formalOrder === undefined && knownValue === undefined) faults.push({ path: 'formalOrder', message: `The procedure ${procedure} compares with the formal order. State it, or choose another procedure.` });
  if (knownValue !== undefined) {
    if (uNumFactor !== undefined) faults.push({ path: 'uNumFactor', message: 'A quantity with a known value is judged by its error and has no u_num. Leave the factor out.' });
    return target === undefined ? faults : [...faults, { path: 'target', message: 'A quantity with a known value is judged by its error, not by a GCI. Leave the target out.' }];
  }
  for (const member of ['tolerance', 'expectExact', 'exactLimit', 'reference', 'derivedOrder'] as const) {
    if (input[member] !== undefined) faults.push({ path: member, message: 'This goes with errors, or with a known value.' });
  }
  return faults;
}

function checkErrors(input: QuickCheckInput): FieldProblem[] {
  const { grids, knownValue, target, formalOrder, tolerance } = input;
  const faults: FieldProblem[] = [];
  const stated = quickCheckNorms.filter((norm) => grids.some((grid) => grid.errors?.[norm] !== undefined));
  if (stated.length === 0) faults.push({ path: 'grids', message: 'Expected a value on every grid, or errors on every grid.' });
  grids.forEach((grid, index) => {
    for (const norm of stated) {
      if (grid.errors?.[norm] === undefined) faults.push({ path: `grids.${index}.errors.${norm}`, message: `Other grids have an ${norm} error. Expected one here too.` });
    }
    for (const norm of quickCheckNorms) {
      if (grid.iterativeError?.[norm] !== undefined && !stated.includes(norm)) faults.push({ path: `grids.${index}.iterativeError.${norm}`, message: `No grid has an ${norm} error.` });
    }
    if (grid.resolution !== undefined) faults.push({ path: `grids.${index}.resolution`, message: 'A resolution goes with a value.' });
  });
  if (knownValue !== undefined) faults.push({ path: 'knownValue', message: 'A known value goes with values, not with errors.' });
  if (target !== undefined) faults.push({ path: 'target', message: 'A target for the GCI goes with values, not with errors.' });
  for (const member of ['procedure', 'uNumFactor'] as const) {
    if (input[member] !== undefined) faults.push({ path: member, message: 'This goes with values, not with errors.' });
  }
  for (const [member, given] of [['formalOrder', formalOrder], ['tolerance', tolerance]] as const) {
    if (typeof given !== 'object') continue;
    for (const norm of quickCheckNorms) {
      if (given[norm] !== undefined && !stated.includes(norm)) faults.push({ path: `${member}.${norm}`, message: `No grid has an ${norm} error.` });
    }
  }
  return faults;
}

function checkOrders({ formalOrder, derivedOrder }: QuickCheckInput): FieldProblem[] {
  if (derivedOrder === undefined) return [];
  if (formalOrder === undefined) return [{ path: 'derivedOrder', message: 'A derived order stands beside a formal order. State the formal order too.' }];
  const highest = typeof formalOrder === 'number' ? formalOrder : Math.max(...Object.values(formalOrder));
  return derivedOrder > highest ? [] : [{ path: 'derivedOrder', message: `Found ${derivedOrder}. Expected more than the formal order ${highest}.` }];
}
