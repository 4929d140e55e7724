import type { CoordinatePart } from './mesh-part';

/** So many rows are looked at one and all, and as many are kept of more. */
const capacity = 2 ** 14;
/** A level stands in the low word of a hash; more rows than this leaves too many of no file has. */
const highestLevel = 31;
const low32 = 2 ** 32;
const signBit = -0x80000000;
/** Bits of a double without a fraction beside the low 32. */
const highBits = 21;
/** Odd factors without a pattern, one for each coordinate and the time. */
const first = [0x9e3779b1, 0x85ebca77, 0xc2b2ae3d, 0x27d4eb2f] as const;
const second = [0x165667b1, 0xd3a2646d, 0xfd7046c5, 0xb55a4f09] as const;

export interface CoordinateSample {
  add(rows: number, columns: readonly Float64Array[]): void;
  addPart(part: CoordinatePart): void;
  /** What was added since the last part. Those to come begin with the level that all so far come to, which spares them what would be dropped in the end. */
  takePart(): CoordinatePart;
  /** Rows that have the coordinates of another before them; of more than 16 384 rows an estimate from one in `oneIn`. */
  duplicates(): { rows: number; oneIn: number };
}

/**
 * Finds rows of the same coordinates in bounded memory: keeps a hash of 53 bits of each, and of more than 16 384 rows only
 * those whose hash is a multiple of a power of two, which twins share. What is kept depends on the rows alone, not on their
 * order or on who looked at them. Two of 16 384 different rows share a hash with a chance of 2·10⁻⁸.
 * Coordinates are the same where their doubles are, −0 and 0 being one.
 */
export function createCoordinateSample(): CoordinateSample {
  let level = 0;
  let mask = 0;
  let count = 0;
  let hashes = new Float64Array(1024);

  /** Hashes of parts taken that are multiples of 2^level and of no higher power. */
  const taken = new Float64Array(highestLevel + 1);

  const raise = (to: number) => {
    level = to;
    mask = 2 ** level - 1;
    let kept = 0;
    for (let i = 0; i < count; i += 1) {
      const hash = hashes[i] as number;
      if ((hash & mask) === 0) hashes[kept++] = hash;
    }
    count = kept;
  };
  const keep = (hash: number) => {
    if (count === hashes.length) {
      const more = new Float64Array(2 * count);
      more.set(hashes);
      hashes = more;
    }
    hashes[count++] = hash;
    while (count > capacity && level < highestLevel) raise(level + 1);
  };

  return {
    add(rows, columns) {
      const words = columns.map((column) => new Int32Array(column.buffer, column.byteOffset, 2 * rows));
      const [one, two, three, four] = words as [Int32Array, ...(Int32Array | undefined)[]];
      for (let row = 0; row < rows; row += 1) {
        let sum = lowTerm(one, row, first[0]);
        if (two !== undefined) sum += lowTerm(two, row, first[1]);
        if (three !== undefined) sum += lowTerm(three, row, first[2]);
        if (four !== undefined) sum += lowTerm(four, row, first[3]);
        const low = mix(sum | 0);
        if ((low & mask) === 0) keep((low >>> 0) + highWord(words, row) * low32);
      }
    },
    addPart(part) {
      if (part.level > level) raise(part.level);
      for (let i = 0; i < part.hashes.length; i += 1) {
        const hash = part.hashes[i] as number;
        if ((hash & mask) === 0) keep(hash);
      }
    },
    takePart() {
      const part = { level, hashes: hashes.slice(0, count) };
      for (const hash of part.hashes) {
        const power = Math.min(highestLevel, 31 - Math.clz32(hash & -hash));
        taken[power] = (taken[power] ?? 0) + 1;
      }
      count = 0;
      while (level < highestLevel && sumFrom(taken, level) > capacity) raise(level + 1);
      return part;
    },
    duplicates() {
      const sorted = hashes.slice(0, count).sort();
      let twins = 0;
      for (let i = 1; i < count; i += 1) if (sorted[i] === sorted[i - 1]) twins += 1;
      return { rows: twins * 2 ** level, oneIn: 2 ** level };
    },
  };
}

function sumFrom(values: Float64Array, from: number): number {
  let sum = 0;
  for (let i = from; i < values.length; i += 1) sum += values[i] as number;
  return sum;
}

/** One of the products whose sum makes the low word. The sign bit turned out by the shift makes −0 the same as 0; the high word keeps −x apart from x. */
function lowTerm(words: Int32Array, row: number, factor: number): number {
  const high = words[2 * row + 1] as number;
  return Math.imul((words[2 * row] as number) ^ ((high << 17) | ((high << 1) >>> 16)), factor);
}

/** As many bits again, of the other word first. */
function highWord(words: readonly Int32Array[], row: number): number {
  let sum = 0;
  for (let axis = 0; axis < words.length; axis += 1) {
    const column = words[axis] as Int32Array;
    const low = column[2 * row] as number;
    const high = column[2 * row + 1] as number;
    sum = (sum + Math.imul(mix(Math.imul(high === signBit && low === 0 ? 0 : high, second[axis] as number) + low), first[axis] as number)) | 0;
  }
  return mix(sum) >>> (32 - highBits);
}

/** The last step of A. Appleby's MurmurHash3. */
function mix(word: number): number {
  let mixed = Math.imul(word ^ (word >>> 16), 0x85ebca6b);
  mixed = Math.imul(mixed ^ (mixed >>> 13), 0xc2b2ae35);
  return mixed ^ (mixed >>> 16);
}
