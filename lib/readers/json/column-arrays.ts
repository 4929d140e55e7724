import { refuseManyColumns } from '../column-limit';
import type { JsonElement, ScalarTaker } from './json-element';

/** What takes the values of one column. */
export interface ColumnSink {
  scalar: ScalarTaker;
  /** A list or an object stands where a value should. */
  nested(line: number): void;
}

export interface ColumnArrays {
  /** What takes the next array, of that name. */
  add(name: string): JsonElement;
  header(): string[];
}

/** Columns as arrays of one object. `begin` gives each its sink, or null where its values are not wanted; columns count from 1. */
export function createColumnArrays(begin: (name: string, column: number) => ColumnSink | null): ColumnArrays {
  const header: string[] = [];
  return {
    add(name) {
      header.push(name);
      refuseManyColumns(header.length);
      const sink = begin(name, header.length);
      return {
        scalar: (kind, bytes, from, to, line) => sink?.scalar(kind, bytes, from, to, line),
        open(_, line) {
          sink?.nested(line);
          return null;
        },
      };
    },
    header: () => header,
  };
}
