import { findGridMap } from '@/db/queries/grid-maps';
import type { GridMapBins } from '@/lib/domain/studies/map-schema';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import { AppError } from '@/lib/errors';
import type { MapPlane } from '@/lib/numerics/maps/error-map';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { requireGrid } from './require-grid';
import { requireStudy } from './require-study';

const digits = 4;
interface MapKey { id: string; label: string; field: string }

/** The bins of one map; 404 where the grid has none of the field in that plane. */
export async function getGridMap(ctx: MemberContext, key: MapKey, { plane, revision }: { plane?: MapPlane; revision?: number }): Promise<GridMapBins> {
  permit(ctx, 'work.read');
  const { row, wanted } = await withOrganisation(ctx, async (trx) => {
    const study = await requireStudy(ctx, trx, key.id, revision);
    const grid = await requireGrid(trx, study, key.label);
    const usual: MapPlane = problemDefinitionSchema.parse(study.bound.problem_definition).dimension === 1 ? 'x' : 'xy';
    const wanted = plane ?? usual;
    return { wanted, row: grid.state === 'read' ? await findGridMap(trx, ctx.organisation.id, grid.id, { field: key.field, plane: wanted }) : undefined };
  });
  if (!row) throw new AppError('not-found', `Grid ${key.label} has no map of ${key.field} in the plane ${wanted}.`);
  const { width, height, largest, shares } = row;
  const binAt = (at: number): number | null => {
    const share = shares.readFloatLE(at * 4);
    return Number.isNaN(share) ? null : Number((share * largest).toPrecision(digits));
  };
  return {
    label: key.label, field: row.field, plane: wanted, width, height, bounds: row.bounds as GridMapBins['bounds'], largest,
    rows: Array.from({ length: height }, (_, up) => Array.from({ length: width }, (_, along) => binAt(up * width + along))),
  };
}
