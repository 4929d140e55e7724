// AssemblyScript. What the reading of rows knows of its table, its columns and its place. It is kept in variables, not in
// memory, which two threads may share.
import { placePowers } from './decimal';

/** What one column keeps while rows are read: 24 bytes. */
@unmanaged
export class Slot {
  /** Its doubles, one after another. */
  values: usize;
  /** Where its last number stands, and how long that is; 0 where it must not be looked at. */
  before: usize;
  length: usize;
  /** Most digits seen, where they are more than 19. */
  long: u32;
  /** A whole number of more digits than any seen: 10 to the power of the most digits seen. */
  limit: u64;
}

export const slotBytes: usize = 24;

export let newline: u32 = 10;
export let delimiter: u32 = 44;
export let isSpaced: bool = false;
export let allowComma: bool = false;
export let width: u32 = 0;
export let capacity: u32 = 0;
/** For every column of the file the address of its slot, 0 where nobody asked for it. */
export let fields: usize = 0;
export let slots: usize = 0;
export let slotCount: u32 = 0;
export let lines: usize = 0;
/** Above 0 while most rows have been numbers and separators alone. */
export let plainRows: i32 = 0;

/** The file's decimal mark, 0 until a number has one. */
export let fileMark: u32 = 0;
/** The line of the number that set it. */
export let markLine: f64 = 0;
/** The line that the last call of readRows ended with. */
export let line: f64 = 0;
export let row: u32 = 0;
/** Where reading goes on; where a row stopped it, that row begins at `rowStart` and ends, with its line, before `at`. */
export let at: usize = 0;
export let rowStart: usize = 0;

/** Where memory is free. */
export function freeFrom(): usize {
  return __heap_base;
}

export function describe(lineEnd: u32, separator: u32, columns: u32, takesComma: bool): void {
  newline = lineEnd;
  delimiter = separator;
  isSpaced = separator == 32;
  width = columns;
  allowComma = takesComma;
}

export function place(powersAt: usize, fieldsAt: usize, slotsAt: usize, count: u32, linesAt: usize, rows: u32): void {
  placePowers(powersAt);
  fields = fieldsAt;
  slots = slotsAt;
  slotCount = count;
  lines = linesAt;
  capacity = rows;
}

/** Begins bytes at `from`, of which `lineBefore` lines went before, in a file whose decimal mark is known or 0. */
export function begin(from: usize, lineBefore: f64, knownMark: u32): void {
  at = from;
  line = lineBefore;
  fileMark = knownMark;
  row = 0;
  plainRows = isSpaced ? 0 : 1000;
  forget();
}

/** Goes on after rows were taken over (0) or after a row that was read elsewhere was kept (one more). */
export function goOn(rows: u32): void {
  row = rows;
}

export function forget(): void {
  for (let index: u32 = 0; index < slotCount; index += 1) changetype<Slot>(slots + <usize>index * slotBytes).length = 0;
}

/** Keeps the decimal mark of the file; false where a number has the other one. */
export function keepMark(mark: u32): bool {
  if (fileMark != 0) return false;
  fileMark = mark;
  markLine = line;
  return true;
}

/** Goes on reading at a place, with so many rows and lines before it. */
export function moveTo(place: usize, rows: u32, lines: f64): void {
  at = place;
  row = rows;
  line = lines;
}

/** Where reading stopped that could not go on with a row. */
export function stopAt(place: usize): void {
  rowStart = place;
}

/** Says how far rows of numbers alone are to be looked for. */
export function expectPlain(rows: i32): void {
  plainRows = rows;
}
