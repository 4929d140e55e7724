import { addMeasure, clearMeasure, type MeasureSum } from './measure-sum';

export type Faces = readonly (readonly number[])[];

/**
 * Adds a solid, whose corners are x y z from their mean and whose faces, lists of corners, turn left seen from outside: the
 * tetrahedra from the mean to the triangles of its faces. A face of more than three corners is the fan of triangles around
 * the mean of its corners: exact for plane faces, and for curved ones the same surface for the cells on both sides of it.
 */
export function addSolid(sum: MeasureSum, corners: Float64Array, faces: Faces): void {
  for (const face of faces) addFace(sum, corners, face);
}

/** The same where faces may turn either way: each counts as seen from the mean, which must see all of them from inside. */
export function addTurnedSolid(sum: MeasureSum, corners: Float64Array, faces: Faces): void {
  const part: MeasureSum = { total: 0, x: 0, y: 0, z: 0 };
  for (const face of faces) {
    clearMeasure(part);
    addFace(part, corners, face);
    addMeasure(sum, part, part.total < 0 ? -1 : 1);
  }
}

function addFace(sum: MeasureSum, corners: Float64Array, face: readonly number[]): void {
  const count = face.length;
  const at = (corner: number, axis: number) => corners[3 * (face[corner] as number) + axis] as number;
  if (count === 3) {
    addTetrahedron(sum, at(0, 0), at(0, 1), at(0, 2), at(1, 0), at(1, 1), at(1, 2), at(2, 0), at(2, 1), at(2, 2));
    return;
  }
  let [x, y, z] = [0, 0, 0];
  for (let corner = 0; corner < count; corner += 1) {
    x += at(corner, 0) / count;
    y += at(corner, 1) / count;
    z += at(corner, 2) / count;
  }
  for (let side = 0; side < count; side += 1) {
    const next = side + 1 === count ? 0 : side + 1;
    addTetrahedron(sum, x, y, z, at(side, 0), at(side, 1), at(side, 2), at(next, 0), at(next, 1), at(next, 2));
  }
}

function addTetrahedron(sum: MeasureSum, ax: number, ay: number, az: number, bx: number, by: number, bz: number, cx: number, cy: number, cz: number): void {
  const volume = (ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx)) / 6;
  sum.total += volume;
  sum.x += volume * (ax + bx + cx) / 4;
  sum.y += volume * (ay + by + cy) / 4;
  sum.z += volume * (az + bz + cz) / 4;
}
