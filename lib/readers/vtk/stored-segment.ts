import type { StoredColumn } from '../column-store';

/** Where the values of one piece stand among those of an array. */
export interface StoredSegment { values: StoredColumn; from: number; length: number }

/** The value at an index of a segment. */
export type StoredNumbers = (index: number) => number;

/** 24 KiB of numbers. */
const blockLength = 3072;

/**
 * Reads a segment in any order through blocks that are kept, each at a place of its own: with one place for values that are
 * read in turn, with more for grids whose neighbours have close numbers.
 */
export function createStoredNumbers({ values, from, length }: StoredSegment, places = 1): StoredNumbers {
  const blocks: (Float64Array | undefined)[] = [];
  const kept: number[] = [];
  let last = -1;
  let block: Float64Array = new Float64Array(0);
  return (index) => {
    const number = Math.floor(index / blockLength);
    if (number !== last) {
      const place = number % places;
      block = blocks[place] ??= new Float64Array(blockLength);
      if (kept[place] !== number) values.copy(from + number * blockLength, Math.min(blockLength, length - number * blockLength), block);
      kept[place] = number;
      last = number;
    }
    return block[index - number * blockLength] as number;
  };
}
