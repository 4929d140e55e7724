import type { Region } from '../assessment';
import { createNormTotal, type NormTotal } from '../norms/combine-norms';
import type { GridNorms } from '../norms/grid-norms';
import type { NormPart } from '../norms/norm-part';
import { regionsOfBand, type Bands } from './bands';

export interface RegionTotal {
  /** Parts of one stretch of rows, by class as prepareRegions gives them, in the order of the file. */
  add: (parts: readonly NormPart[]) => void;
  rows: () => number;
  /** As createNormTotal, with the parts of the domain that have rows. Of equal largest errors in several classes the first class has its place named. */
  finish: (significantDigits: readonly (number | null)[]) => GridNorms | null;
}

interface Part { region: Region; total: NormTotal; has: (kind: number) => boolean }

/** Puts parts together into the norms of a grid and of the regions that the bands make of it; sums are added in the order in which parts come. */
export function createRegionTotal(fields: readonly string[], bands: Bands | undefined): RegionTotal {
  const whole = createNormTotal(fields);
  const parts = (bands?.bands ?? []).flatMap(({ name }, index): Part[] => {
    const { interior, boundary } = regionsOfBand(name);
    return [
      { region: interior, total: createNormTotal(fields), has: (kind) => (kind & (1 << index)) === 0 },
      { region: boundary, total: createNormTotal(fields), has: (kind) => (kind & (1 << index)) !== 0 },
    ];
  });
  return {
    add(given) {
      for (const [kind, part] of given.entries()) {
        whole.add(part);
        for (const { total, has } of parts) if (has(kind)) total.add(part);
      }
    },
    rows: () => whole.rows(),
    finish(significantDigits) {
      const norms = whole.finish(significantDigits);
      if (norms === null || bands === undefined) return norms;
      const regions = parts.flatMap(({ region, total }) => {
        const own = total.finish(significantDigits);
        return own === null ? [] : [{ region, ...own }];
      });
      return { ...norms, regions };
    },
  };
}
