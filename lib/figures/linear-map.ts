/** The straight map that takes `from` to `start` and `to` to `end`. */
export function linearMap(from: number, to: number, start: number, end: number): (value: number) => number {
  if (from === to) throw new RangeError(`linearMap needs two different ends, got ${from} twice`);
  return (value) => start + ((value - from) / (to - from)) * (end - start);
}
