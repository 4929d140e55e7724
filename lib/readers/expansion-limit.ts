import { RejectedFile } from './rejected-file';

/** Tables of numbers expand 2 to 20 times, those of few different values a hundred times. */
const mostTimes = 250;
/** A small file may hold the same row again and again. */
const freeBytes = 64 * 1024 * 1024;
const mostBytes = 50e9;

export interface ExpansionLimit {
  noteStored(bytes: number): void;
  /** Throws RejectedFile once more has come out than any file of numbers holds. */
  noteExpanded(bytes: number): void;
}

function tooMuch(found: string, expected: string): RejectedFile {
  return new RejectedFile([{ code: 'expands-too-far', count: 1, line: null, column: null, found, expected }]);
}

/** Watches what comes out of a compressed file against what went in. */
export function createExpansionLimit(): ExpansionLimit {
  let stored = 0;
  let expanded = 0;
  return {
    noteStored(bytes) {
      stored += bytes;
    },
    noteExpanded(bytes) {
      expanded += bytes;
      if (expanded > mostBytes) throw tooMuch(`more than ${mostBytes / 1e9} GB`, `at most ${mostBytes / 1e9} GB`);
      if (expanded > freeBytes && expanded > stored * mostTimes) {
        throw tooMuch(`more than ${Math.floor(expanded / 1e6)} MB from the first ${stored} bytes`, `at most ${mostTimes} times as much as is stored`);
      }
    },
  };
}
