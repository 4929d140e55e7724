import type { MeasureSum } from './measure-sum';

const inOrder = (count: number, order: readonly number[] | undefined, place: number): number => 3 * (order?.[place % count] ?? place % count);

/**
 * Adds a polygon, whose corners are x y z from their mean: the length of the sum of its triangles' area vectors from the mean,
 * which is its area where it is plane, convex or not, whichever way it turns.
 */
export function addPolygon(sum: MeasureSum, corners: Float64Array, count: number, order?: readonly number[]): void {
  const at = (index: number) => corners[index] as number;
  let [nx, ny, nz] = [0, 0, 0];
  for (let side = 0; side < count; side += 1) {
    const [a, b] = [inOrder(count, order, side), inOrder(count, order, side + 1)];
    nx += at(a + 1) * at(b + 2) - at(a + 2) * at(b + 1);
    ny += at(a + 2) * at(b) - at(a) * at(b + 2);
    nz += at(a) * at(b + 1) - at(a + 1) * at(b);
  }
  const length = Math.hypot(nx, ny, nz);
  if (length === 0) return;
  for (let side = 0; side < count; side += 1) {
    const [a, b] = [inOrder(count, order, side), inOrder(count, order, side + 1)];
    const part = ((at(a + 1) * at(b + 2) - at(a + 2) * at(b + 1)) * nx + (at(a + 2) * at(b) - at(a) * at(b + 2)) * ny
      + (at(a) * at(b + 1) - at(a + 1) * at(b)) * nz) / (2 * length);
    sum.x += part * (at(a) + at(b)) / 3;
    sum.y += part * (at(a + 1) + at(b + 1)) / 3;
    sum.z += part * (at(a + 2) + at(b + 2)) / 3;
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
