import type { ReaderMapping } from '../domain/columns/column-mapping';
import type { MapTask } from '../numerics/maps/error-map';
import type { Bands } from '../numerics/regions/bands';

export interface GridReading {
  mapping: ReaderMapping;
  problem: {
    dimension: 1 | 2 | 3;
    exact: Readonly<Record<string, string>>;
    constants: Readonly<Record<string, number | string>>;
  };
  /** What each field of the file is compared with: an expression of the exact fields, or the exact field of its name. */
  fields: readonly { field: string; compare?: string }[];
  /**
   * Where the file holds cell averages: points per direction to average the exact expressions by, and the size of the cells
   * along each direction where no columns dx, dy, dz hold it.
   */
  average?: { points: number; extents: readonly number[] | null };
  /** Whether to look at the mesh too: at coordinates that repeat, and at the sizes of cells where weights are such. */
  mesh?: { sizes: boolean };
  /** The components of a displacement whose best rigid motion is wanted, and where to take coordinates from. */
  rigid?: { fields: readonly string[]; origin: readonly number[] };
  /** The time of the grid, where the file has no column of times. */
  t?: number;
  /** Bands along the boundary, where norms of them and of what lies inside of each are asked for. */
  bands?: Bands;
  /** Which fields have maps of their errors. */
  maps?: MapTask;
}
