import { json } from '@/db/json';
import type { GridMapRow } from '@/db/queries/grid-maps';
import type { ErrorMap } from '@/lib/numerics/maps/error-map';

/** A map as it is kept: shares as single precision, the least byte first. */
export function mapRow({ field, plane, width, height, bounds, largest, shares }: ErrorMap): GridMapRow {
  const bytes = Buffer.alloc(shares.length * 4);
  for (const [at, share] of shares.entries()) bytes.writeFloatLE(share, at * 4);
  return { field, plane, width, height, bounds: json(bounds), largest, shares: bytes };
}
