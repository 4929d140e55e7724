import { listGrids, type GridRow } from '@/db/queries/grids';
import { AppError } from '@/lib/errors';
import type { Trx } from '../with-organisation';
import type { LoadedStudy } from './require-study';

/** A grid of a study's revision by its label, or 404. */
export async function requireGrid(trx: Trx, { at }: LoadedStudy, label: string): Promise<GridRow> {
  const row = (await listGrids(trx, at)).find((grid) => grid.label === label);
  if (!row) throw new AppError('not-found', `The study has no grid ${label}.`);
  return row;
}
