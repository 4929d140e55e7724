/** Math.pow, exp and log differ in their last bit between engines; sums of them in a few more. */
const closeEnough = 1e-10;
const mostDifferences = 20;

export type Reproduction = 'identical' | 'within-1e-10' | 'not-reproduced';
export interface ResultDifference { path: string; before: string | number | boolean | null; after: string | number | boolean | null }
interface Comparison { result: Reproduction; largestDifference: number; differences: ResultDifference[] }

/**
 * Compares a kept result with one computed again, by value: identical, every number within 1e-10 of it relative to the
 * larger of the two, or not reproduced. Members that the kept one does not have are of a later version and are passed
 * over. `differences` are the first 20 beyond 1e-10, with their paths.
 */
export function compareResults(kept: unknown, again: unknown): Comparison {
  const found: Comparison = { result: 'identical', largestDifference: 0, differences: [] };
  compareAt('', { kept, again }, found);
  if (found.differences.length > 0) found.result = 'not-reproduced';
  else if (found.largestDifference > 0) found.result = 'within-1e-10';
  return found;
}

function compareAt(path: string, { kept, again }: { kept: unknown; again: unknown }, found: Comparison): void {
  if (Object.is(kept, again) || (kept === 0 && again === 0)) return;
  if (typeof kept === 'number' && typeof again === 'number') {
    const difference = Math.abs(kept - again) / Math.max(Math.abs(kept), Math.abs(again));
    found.largestDifference = Math.max(found.largestDifference, Number.isFinite(difference) ? difference : 1);
    if (difference <= closeEnough) return;
  } else if (isObject(kept) && isObject(again) && Array.isArray(kept) === Array.isArray(again)) {
    if (Array.isArray(kept) && Array.isArray(again) && kept.length !== again.length) note(`${path}.length`, { before: kept.length, after: again.length }, found);
    for (const [name, value] of Object.entries(kept)) compareAt(path === '' ? name : `${path}.${name}`, { kept: value, again: again[name] }, found);
    return;
  }
  note(path, { before: printable(kept), after: printable(again) }, found);
}

function note(path: string, values: Omit<ResultDifference, 'path'>, found: Comparison): void {
  if (found.differences.length < mostDifferences) found.differences.push({ path, ...values });
}

function isObject(value: unknown): value is Record<string, unknown> {
  return typeof value === 'object' && value !== null;
}

function printable(value: unknown): ResultDifference['before'] {
  if (typeof value === 'string' || typeof value === 'number' || typeof value === 'boolean' || value === null) return value;
  return value === undefined ? null : JSON.stringify(value).slice(0, 200);
}
