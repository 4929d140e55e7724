import type { NotAvailableYet } from '../api/not-yet';
import type { QuickCheckInput } from './quick-schema';

/** The first member that asks for what is not available yet. */
export function notYetOfQuickCheck({ grids, formalOrder, tolerance }: QuickCheckInput): NotAvailableYet | null {
  const perNorm: [string, object | undefined][] = grids.flatMap((grid, index) => [
    [`grids.${index}.errors`, grid.errors], [`grids.${index}.iterativeError`, grid.iterativeError],
  ]);
  if (typeof formalOrder === 'object') perNorm.push(['formalOrder', formalOrder]);
  if (typeof tolerance === 'object') perNorm.push(['tolerance', tolerance]);
  for (const [path, given] of perNorm) {
    const norm = ['H1', 'energy'].find((name) => given !== undefined && Object.hasOwn(given, name));
    if (norm !== undefined) return { path: `${path}.${norm}`, what: `The ${norm} norm` };
  }
  return null;
}
