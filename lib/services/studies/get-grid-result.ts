import { listGridMaps } from '@/db/queries/grid-maps';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import type { GridResult } from '@/lib/domain/studies/schema';
import { AppError } from '@/lib/errors';
import type { MapPlane } from '@/lib/numerics/maps/error-map';
import type { GridNorms } from '@/lib/numerics/norms/grid-norms';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';
import { normsOf } from './grid-definition';
import { meshFacts } from './mesh-facts';
import { requireGrid } from './require-grid';
import { requireStudy } from './require-study';

/** Norms and statistics of what was read from the file of a grid; 404 until it is read. */
export async function getGridResult(ctx: MemberContext, key: { id: string; label: string }, revision?: number): Promise<GridResult> {
  permit(ctx, 'work.read');
  const { row, maps } = await withOrganisation(ctx, async (trx) => {
    const row = await requireGrid(trx, await requireStudy(ctx, trx, key.id, revision), key.label);
    return { row, maps: await listGridMaps(trx, ctx.organisation.id, row.id) };
  });
  const norms = normsOf(row);
  if (row.state !== 'read' || !norms) throw new AppError('not-found', `No file of grid ${row.label} has been read; it is ${row.state}.`);
  return {
    label: row.label, upload: row.upload_id ?? '', sha256: row.sha256 ?? '', rows: norms.rows, ...(norms.rowsLeftOut !== undefined && { rowsLeftOut: norms.rowsLeftOut }), weightSum: norms.weightSum,
    equalWeights: norms.equalWeights, mapping: row.mapping as unknown as ColumnMapping,
    ...statedNorms(norms),
    ...(norms.solutions && { solutions: norms.solutions.map(({ field, L1, L2, Linf, min, max, count, significantDigits }) => ({ field, L1, L2, Linf, minimum: min, maximum: max, count, significantDigits })) }),
    regions: (norms.regions ?? []).map((part) => ({ region: part.region, rows: part.rows, weightSum: part.weightSum, ...statedNorms(part) })),
    maps: maps.map((map) => ({ ...map, plane: map.plane as MapPlane, bounds: map.bounds as GridResult['maps'][number]['bounds'] })),
    ...(norms.mesh && { mesh: meshFacts(norms.mesh) }),
    ...(norms.motion && { motion: norms.motion }),
    numericsVersion: row.numerics_version ?? '',
  };
}

function statedNorms({ fields, gradients = [] }: GridNorms): Pick<GridResult, 'fields' | 'gradients'> {
  return {
    fields: fields.map(({ field, L1, L2, Linf, at, mean, exact, min, max, count, significantDigits, datum }) => ({
      field, L1, L2, Linf, at, signedMean: mean, exact, minimum: min, maximum: max, count, significantDigits, ...(datum && { datum }),
    })),
    gradients: gradients.map(({ field, H1, exactH1 }) => ({ field, H1, exactH1 })),
  };
}
