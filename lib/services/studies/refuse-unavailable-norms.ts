import type { GridInput } from '@/lib/domain/studies/input';
import { notAvailable } from '@/lib/errors';

/** H1 and energy norms cannot be judged yet, typed ones neither. `prefix` leads to the grid within the request. */
export function refuseUnavailableNorms(grid: Pick<GridInput, 'errors' | 'iterativeError'>, prefix: string): void {
  for (const member of ['errors', 'iterativeError'] as const) {
    for (const [field, norms] of Object.entries(grid[member] ?? {})) {
      for (const norm of ['H1', 'energy'] as const) {
        if (norms[norm] !== undefined) throw notAvailable(`${prefix}${member}.${field}.${norm}`, `The ${norm} norm`);
      }
    }
  }
}
