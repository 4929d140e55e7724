import type { Interval } from '../regions/bands';
import { mapSide, type MapTask } from './error-map';

/**
 * Which bin a coordinate falls into. In a box, its place between the two sides; a row outside counts in the bin at the side,
 * one between two bins in the upper. Without a box, bins are the multiples of a power of two, the same for every direction,
 * which doubles until all rows seen fit: bins of one lattice then lie whole in those of any later one, and what they
 * come to does not depend on the order of the rows.
 */
export interface MapLattice {
  /** The power of two; null in a box. */
  exponent: number | null;
  /** First and last bin along each direction. */
  first: number[];
  last: number[];
}

/** An edge may be missed by rounding. */
const edge = 1e-6;
/** Bins are counted in 32 bits. */
const mostBits = 29;

/** The lattice before any row. A box has its own from the beginning: one bin a cell where its size is known, and never more than there is room for. */
export function startLattice({ box, h, dimension }: MapTask): MapLattice {
  if (box === null) return { exponent: -Infinity, first: Array.from({ length: dimension }, () => Infinity), last: Array.from({ length: dimension }, () => -Infinity) };
  const bins = box.map(([low, high]) => (h === null ? mapSide : Math.min(mapSide, Math.max(1, Math.round((high - low) / h)))));
  return { exponent: null, first: bins.map(() => 0), last: bins.map((count) => count - 1) };
}

/** The bins of rows along one direction; without a box modulo 256, which tells them apart. */
export function binsAlong(values: Float64Array, rows: number, { lattice, axis, box }: { lattice: MapLattice; axis: number; box: MapTask['box'] }, into: Int32Array): void {
  const side = box?.[axis];
  if (side === undefined || lattice.exponent !== null) {
    const scale = 2 ** -(lattice.exponent ?? 0);
    for (let i = 0; i < rows; i += 1) into[i] = Math.floor((values[i] as number) * scale) & (mapSide - 1);
    return;
  }
  const last = lattice.last[axis] ?? 0;
  const [low, high] = side;
  const scale = (last + 1) / (high - low);
  for (let i = 0; i < rows; i += 1) {
    const place = ((values[i] as number) - low) * scale + edge;
    into[i] = place < 0 ? 0 : place > last ? last : place | 0;
  }
}

/** The lattice that also holds these rows; the same one where they fit. */
export function latticeOfRows(lattice: MapLattice, axes: readonly Float64Array[], rows: number): MapLattice {
  if (lattice.exponent === null) return lattice;
  const ranges = axes.map((values) => rangeOf(values, rows));
  const size = Math.max(...ranges.map(([low, high]) => Math.max(Math.abs(low), Math.abs(high))));
  if (!Number.isFinite(size)) return lattice;
  const width = Math.max(...ranges.map(([low, high]) => high - low));
  // The least power by which neither the bins are too many nor their numbers too large.
  const least = Math.max(exponentOf(width) - 9, exponentOf(size) - mostBits, -1000);
  for (let exponent = least; ; exponent += 1) {
    const scale = 2 ** -exponent;
    const own = { exponent, first: ranges.map(([low]) => Math.floor(low * scale)), last: ranges.map(([, high]) => Math.floor(high * scale)) };
    if (fits(own)) return joinLattices(lattice, own);
  }
}

/** The finest lattice that holds what two hold. */
export function joinLattices(one: MapLattice, other: MapLattice): MapLattice {
  if (one.exponent === null || other.exponent === null) return one;
  for (let exponent = Math.max(one.exponent, other.exponent); ; exponent += 1) {
    const [a, b] = [coarsen(one, exponent), coarsen(other, exponent)];
    const joined = {
      exponent, first: a.first.map((bin, axis) => Math.min(bin, b.first[axis] ?? bin)), last: a.last.map((bin, axis) => Math.max(bin, b.last[axis] ?? bin)),
    };
    if (fits(joined)) return joined;
  }
}

/** The place of a bin that is known modulo 256, and the first there is. */
export function wholePlace(part: number, first: number): number {
  return first + ((part - first) & (mapSide - 1));
}

/** The same bins by a greater power of two. */
function coarsen({ exponent, first, last }: MapLattice, to: number): MapLattice {
  if (exponent === null || exponent === -Infinity) return { exponent: to, first, last };
  const scale = 2 ** (exponent - to);
  return { exponent: to, first: first.map((bin) => Math.floor(bin * scale)), last: last.map((bin) => Math.floor(bin * scale)) };
}

function fits({ first, last }: MapLattice): boolean {
  return first.every((bin, axis) => (last[axis] ?? bin) - bin < mapSide);
}

function rangeOf(values: Float64Array, rows: number): Interval {
  let low = Infinity;
  let high = -Infinity;
  for (let i = 0; i < rows; i += 1) {
    const value = values[i] as number;
    if (value < low) low = value;
    if (value > high) high = value;
  }
  return [low, high];
}

function exponentOf(size: number): number {
  return size > 0 ? Math.floor(Math.log2(size)) : -Infinity;
}
