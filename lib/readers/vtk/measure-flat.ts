import type { MeasureSum } from './measure-sum';

/**
 * Adds a polygon, whose corners are x y z from their mean, one after another around it: the length of the sum of its triangles'
 * area vectors from the mean, which is its area where it is plane, convex or not, whichever way it turns.
 */
export function addPolygon(sum: MeasureSum, corners: Float64Array, count: number): void {
  const last = 3 * count - 3;
  let nx = 0;
  let ny = 0;
  let nz = 0;
  for (let b = 0, a = last; b <= last; a = b, b += 3) {
    const ax = corners[a] as number;
    const ay = corners[a + 1] as number;
    const az = corners[a + 2] as number;
    const bx = corners[b] as number;
    const by = corners[b + 1] as number;
    const bz = corners[b + 2] as number;
    nx += ay * bz - az * by;
    ny += az * bx - ax * bz;
    nz += ax * by - ay * bx;
  }
  const length = Math.sqrt(nx * nx + ny * ny + nz * nz);
  if (length === 0) return;
  for (let b = 0, a = last; b <= last; a = b, b += 3) {
    const ax = corners[a] as number;
    const ay = corners[a + 1] as number;
    const az = corners[a + 2] as number;
    const bx = corners[b] as number;
    const by = corners[b + 1] as number;
    const bz = corners[b + 2] as number;
    const part = ((ay * bz - az * by) * nx + (az * bx - ax * bz) * ny + (ax * by - ay * bx) * nz) / (6 * length);
    sum.x += part * (ax + bx);
    sum.y += part * (ay + by);
    sum.z += part * (az + bz);
  }
  sum.total += length / 2;
}

/** Adds the triangles of a strip, each of three corners that follow each other. */
export function addStrip(sum: MeasureSum, corners: Float64Array, count: number): void {
  for (let first = 0; first + 2 < count; first += 1) {
    const [a, b, c] = [0, 3, 6].map((offset) => corners.subarray(3 * first + offset, 3 * first + offset + 3)) as [Float64Array, Float64Array, Float64Array];
    const [ax = 0, ay = 0, az = 0] = a;
    const [ux, uy, uz] = [(b[0] as number) - ax, (b[1] as number) - ay, (b[2] as number) - az];
    const [vx, vy, vz] = [(c[0] as number) - ax, (c[1] as number) - ay, (c[2] as number) - az];
    addPart(sum, Math.hypot(uy * vz - uz * vy, uz * vx - ux * vz, ux * vy - uy * vx) / 2, [ax + (ux + vx) / 3, ay + (uy + vy) / 3, az + (uz + vz) / 3]);
  }
}

/** Adds the lengths between corners that follow each other. */
export function addLine(sum: MeasureSum, corners: Float64Array, count: number): void {
  for (let corner = 1; corner < count; corner += 1) {
    const [ax = 0, ay = 0, az = 0] = corners.subarray(3 * corner - 3, 3 * corner);
    const [bx = 0, by = 0, bz = 0] = corners.subarray(3 * corner, 3 * corner + 3);
    addPart(sum, Math.hypot(bx - ax, by - ay, bz - az), [(ax + bx) / 2, (ay + by) / 2, (az + bz) / 2]);
  }
}

function addPart(sum: MeasureSum, part: number, [x, y, z]: readonly [number, number, number]): void {
  sum.total += part;
  sum.x += part * x;
  sum.y += part * y;
  sum.z += part * z;
}
