import type { Node } from '../numerics/expression/node';
import type { MapRoom } from '../numerics/maps/map-room';
import type { MeshPart } from '../numerics/mesh/mesh-part';
import type { NormPart } from '../numerics/norms/norm-part';
import type { RigidPart } from '../numerics/rigid/rigid-gatherer';
import type { GridReading } from './grid-reading';
import type { ColumnPlan } from './plan-columns';

/** What norms are made from, beside columns: plain data, which a thread can hand to another. */
export interface GridTask {
  plan: ColumnPlan;
  fields: string[];
  /** The exact value of every field. */
  exact: Node[];
  average?: GridReading['average'];
  mesh?: GridReading['mesh'];
  rigid?: GridReading['rigid'];
  /** The time of the grid, where the file has no column of times. */
  t?: number;
  bands?: GridReading['bands'];
  maps?: GridReading['maps'];
  /** Where this thread gathers maps. */
  mapRoom?: MapRoom;
}

/** What some of the rows of a grid come to. */
export interface GridPart {
  /** By class of rows where parts of the domain are asked for (prepareRegions), else one. */
  norms: NormPart[];
  /** Null where the mesh is not asked for. */
  mesh: MeshPart | null;
  /** Null where no rigid motion is asked for. */
  rigid: RigidPart | null;
}
