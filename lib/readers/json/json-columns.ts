import { refuseManyColumns } from '../column-limit';
import { createJsonStructure, type JsonScalar, type JsonStructure } from './json-structure';
import { rejectAtOnce, type ReasonCollector } from '../reason-collector';

/** What is done with the values of one column: its place among the columns counts from 1. */
export type ColumnSink = (kind: JsonScalar | 'list', bytes: Buffer, from: number, to: number, line: number, row: number) => void;

export interface JsonColumns extends JsonStructure {
  /** The names of the columns seen so far. */
  header(): string[];
}

/** Names that the open HDF5/JSON layout has at its top; columns are found in it another way. */
const hdf5Names: ReadonlySet<string> = new Set(['apiVersion', 'root', 'groups', 'datasets', 'datatypes']);
const none = Buffer.alloc(0);

/**
 * Finds the columns of a JSON document: the arrays of its object, or of the object `columns` in it. Everything else in the
 * document is passed over. `begin` gives each column its sink, or null where its values are not wanted.
 */
export function createJsonColumns(begin: (name: string, column: number) => ColumnSink | null, reasons: ReasonCollector): JsonColumns {
  const header: string[] = [];
  let depth = 0;
  let columnDepth = 1;
  let name = '';
  let sink: ColumnSink | null = null;
  let inColumn = false;
  let row = 0;

  const refuse = (found: string): never => rejectAtOnce(reasons, {
    code: 'unsupported-format', line: null, column: null, found, expected: 'JSON as an object with one array of numbers per column',
  });

  const structure = createJsonStructure({
    open(kind) {
      if (depth === 0 && kind === 'array') refuse('JSON as a list of records');
      if (depth === 1 && kind === 'object' && hdf5Names.has(name)) refuse('HDF5 converted to JSON');
      if (inColumn && depth === columnDepth + 1) {
        sink?.('list', none, 0, 0, 0, row);
        row += 1;
      }
      if (depth === 1 && kind === 'object' && name === 'columns') columnDepth = 2;
      else if (depth === columnDepth && kind === 'array' && !inColumn) {
        header.push(name);
        refuseManyColumns(header.length);
        inColumn = true;
        row = 0;
        sink = begin(name, header.length);
      }
      depth += 1;
    },
    close() {
      depth -= 1;
      if (depth === columnDepth) inColumn = false;
      if (columnDepth === 2 && depth === 1) columnDepth = 1;
    },
    key(found) {
      if (!inColumn) name = found;
    },
    scalar(kind, bytes, from, to, line) {
      if (depth === 0) refuse('JSON without an object');
      if (depth === 1 && name === 'apiVersion') refuse('HDF5 converted to JSON');
      if (!inColumn || depth !== columnDepth + 1) return;
      sink?.(kind, bytes, from, to, line, row);
      row += 1;
    },
  }, reasons);

  return { ...structure, header: () => header };
}
