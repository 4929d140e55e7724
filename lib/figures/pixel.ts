/** The middle of the pixel that a position falls in, so that a line one pixel wide is sharp. */
export function pixel(position: number): number {
  return Math.floor(position) + 0.5;
}
