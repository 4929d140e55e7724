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
  if (count === 3) {
    const [a, b, c] = [3 * (face[0] as number), 3 * (face[1] as number), 3 * (face[2] as number)];
    addTetrahedron(sum, corners, corners[a] as number, corners[a + 1] as number, corners[a + 2] as number, b, c);
    return;
  }
  let x = 0;
  let y = 0;
  let z = 0;
  for (let corner = 0; corner < count; corner += 1) {
    const at = 3 * (face[corner] as number);
    x += corners[at] as number;
    y += corners[at + 1] as number;
    z += corners[at + 2] as number;
  }
  let last = 3 * (face[count - 1] as number);
  for (let corner = 0; corner < count; corner += 1) {
    const at = 3 * (face[corner] as number);
    addTetrahedron(sum, corners, x / count, y / count, z / count, last, at);
    last = at;
  }
}

/** The tetrahedron from the mean to a triangle, of one corner by its coordinates and two by where they stand. */
function addTetrahedron(sum: MeasureSum, corners: Float64Array, ax: number, ay: number, az: number, b: number, c: number): void {
  const bx = corners[b] as number;
  const by = corners[b + 1] as number;
  const bz = corners[b + 2] as number;
  const cx = corners[c] as number;
  const cy = corners[c + 1] as number;
  const cz = corners[c + 2] as number;
  const volume = (ax * (by * cz - bz * cy) + ay * (bz * cx - bx * cz) + az * (bx * cy - by * cx)) / 6;
  sum.total += volume;
  sum.x += volume * (ax + bx + cx) / 4;
  sum.y += volume * (ay + by + cy) / 4;
  sum.z += volume * (az + bz + cz) / 4;
}
