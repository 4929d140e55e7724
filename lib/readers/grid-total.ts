import { drawMaps } from '../numerics/maps/draw-maps';
import type { ErrorMap } from '../numerics/maps/error-map';
import { createMapRoom, type MapRoom } from '../numerics/maps/map-room';
import { createMeshTotal } from '../numerics/mesh/mesh-total';
import type { GridNorms } from '../numerics/norms/grid-norms';
import { createRegionTotal } from '../numerics/regions/region-total';
import { createRigidGatherer } from '../numerics/rigid/rigid-gatherer';
import { bestRigidMotion } from '../numerics/rigid/rigid-motion';
import type { GridPart, GridTask } from './grid-task';

export interface GridTotal {
  /** Parts in the order of the file. */
  add: (part: GridPart) => void;
  rows: () => number;
  /** The task for another thread, which gathers its maps in a room of its own. */
  taskOfHelper(): GridTask;
  /** Null where there were no rows. */
  finish(significantDigits: readonly (number | null)[]): { norms: GridNorms; maps: ErrorMap[] } | null;
}

/** Puts together what the rows of a grid come to. */
export function createGridTotal(task: GridTask): GridTotal {
  const { maps } = task;
  const norms = createRegionTotal(task.fields, task.bands);
  const mesh = createMeshTotal();
  const moments = task.rigid ? createRigidGatherer(task.rigid.origin) : null;
  const rooms: MapRoom[] = task.mapRoom ? [task.mapRoom] : [];
  return {
    add(part) {
      const before = norms.rows();
      norms.add(part.norms);
      if (part.rigid) moments?.addPart(part.rigid);
      if (part.mesh) mesh.add(part.mesh, norms.rows() - before);
    },
    rows: norms.rows,
    taskOfHelper() {
      if (maps === undefined) return task;
      const mapRoom = createMapRoom(maps);
      rooms.push(mapRoom);
      return { ...task, mapRoom };
    },
    finish(significantDigits) {
      const found = norms.finish(significantDigits);
      const survey = mesh.finish();
      return found === null ? null : { norms: { ...found, ...(survey && { mesh: survey }), ...(moments && { motion: bestRigidMotion(moments.sums()) }) }, maps: maps ? drawMaps(maps, rooms, found.rows) : [] };
    },
  };
}
