import type { CellShape } from './cell-types';
import { addLine, addPolygon, addStrip } from './measure-flat';
import { addSolid, addTurnedSolid, type Faces } from './measure-solid';
import { clearMeasure, type MeasureSum } from './measure-sum';

/** Length, area or volume of a cell, 1 for a vertex, and its centre. */
export interface CellMeasure { measure: number; x: number; y: number; z: number }

/** Measures a cell of `count` corners, x y z of each one after another; the faces are those of a polyhedron. */
export type CellMeasurer = (shape: CellShape, corners: Float64Array, count: number, faces?: Faces) => CellMeasure;

/**
 * Measures cells with straight edges as `measure-flat` and `measure-solid` say; the answer is one object, used again. The
 * centre is by measure, and the mean of the corners where the measure is 0. A solid turned inside out has a negative measure;
 * of wedges, prisms and polyhedra either order of corners is taken.
 */
export function createCellMeasurer(): CellMeasurer {
  const answer: CellMeasure = { measure: 0, x: 0, y: 0, z: 0 };
  const sum: MeasureSum = { total: 0, x: 0, y: 0, z: 0 };
  let local = new Float64Array(3 * 32);
  return (shape, corners, count, faces = []) => {
    let [x, y, z] = [0, 0, 0];
    for (let at = 0; at < 3 * count; at += 3) {
      x += corners[at] as number;
      y += corners[at + 1] as number;
      z += corners[at + 2] as number;
    }
    x /= count;
    y /= count;
    z /= count;
    if (local.length < 3 * count) local = new Float64Array(6 * count);
    for (let place = 0; place < count; place += 1) {
      const at = 3 * (shape.order === null ? place : shape.order[place] as number);
      local[3 * place] = (corners[at] as number) - x;
      local[3 * place + 1] = (corners[at + 1] as number) - y;
      local[3 * place + 2] = (corners[at + 2] as number) - z;
    }
    clearMeasure(sum);
    addParts(sum, shape, { corners: local, count, faces });
    const factor = sum.total === 0 ? 0 : 1 / sum.total;
    answer.measure = shape.kind === 'point' ? 1 : shape.mayTurn ? Math.abs(sum.total) : sum.total;
    answer.x = x + sum.x * factor;
    answer.y = y + sum.y * factor;
    answer.z = z + sum.z * factor;
    return answer;
  };
}

function addParts(sum: MeasureSum, shape: CellShape, { corners, count, faces }: { corners: Float64Array; count: number; faces: Faces }): void {
  switch (shape.kind) {
    case 'point': return;
    case 'line': return addLine(sum, corners, count);
    case 'strip': return addStrip(sum, corners, count);
    case 'polygon': return addPolygon(sum, corners, count);
    case 'solid': return addSolid(sum, corners, shape.faces);
    case 'polyhedron': return addTurnedSolid(sum, corners, faces);
  }
}
