/** Parts of a cell added up: their measure, and their centres times their measure, from the mean of the corners. */
export interface MeasureSum { total: number; x: number; y: number; z: number }

export function addMeasure(sum: MeasureSum, other: MeasureSum, factor: number): void {
  sum.total += factor * other.total;
  sum.x += factor * other.x;
  sum.y += factor * other.y;
  sum.z += factor * other.z;
}

export function clearMeasure(sum: MeasureSum): void {
  sum.total = 0;
  sum.x = 0;
  sum.y = 0;
  sum.z = 0;
}
