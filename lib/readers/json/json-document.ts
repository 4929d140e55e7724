import { rejectAtOnce, type ReasonCollector } from '../reason-collector';
import { createColumnArrays, type ColumnSink } from './column-arrays';
import { createJsonWalk, passOver, type JsonContainer, type JsonElement } from './json-element';
import { createJsonStructure, type JsonStructure } from './json-structure';
import { createRecordList, type RecordSink } from './record-lists';

export type JsonLayout = 'columns' | 'records' | 'hdf5';

export interface DocumentParts {
  /** Gives a column its sink, or null where its values are not wanted; columns count from 1. */
  column(name: string, column: number): ColumnSink | null;
  /** A list of records begins. */
  records(): RecordSink;
  /** What takes a member of the open HDF5/JSON layout; null where it has none of that name. */
  hdf5(name: string): JsonElement | null;
}

export interface JsonDocument extends JsonStructure {
  layout(): JsonLayout;
  /** Whether the document is itself a list, whose first record tells all. */
  isList(): boolean;
  /** The names of the columns that are arrays. */
  header(): string[];
}

const hdf5Objects: ReadonlySet<string> = new Set(['groups', 'datasets', 'datatypes']);

/**
 * Finds the table in a JSON document: columns as the arrays of its object, or of the object `columns` in it; records as a
 * list of objects, which is the document or a member of it; or HDF5 in its open JSON layout. All else is passed over.
 */
export function createJsonDocument(parts: DocumentParts, reasons: ReasonCollector): JsonDocument {
  const columns = createColumnArrays((name, column) => parts.column(name, column));
  let layout: JsonLayout = 'columns';
  let isList = false;
  const refuse = (found: string): never => rejectAtOnce(reasons, {
    code: 'unsupported-format', line: null, column: null, found, expected: 'JSON as an object with one array of numbers per column, or as a list of records',
  });

  /** A list: records where its first item is an object, else a column. */
  const list = (name: string, isDocument: boolean): JsonContainer => {
    let items: JsonElement | null = null;
    const asColumn = () => (items = isDocument ? refuse('JSON as a list of values') : columns.add(name));
    const first: JsonElement = {
      scalar: (kind, bytes, from, to, line) => asColumn().scalar(kind, bytes, from, to, line),
      open(kind, line) {
        if (kind === 'array') return asColumn().open(kind, line);
        if (layout === 'columns') layout = 'records';
        items = createRecordList(parts.records());
        return items.open(kind, line);
      },
    };
    return {
      child: () => items ?? first,
      close() {
        // Nothing in it: a column without rows.
        if (items === null && !isDocument) columns.add(name);
      },
    };
  };

  const member = (name: string, isOutermost: boolean): JsonElement => {
    const part = isOutermost ? parts.hdf5(name) : null;
    return {
      scalar: (kind, bytes, from, to, line) => part?.scalar(kind, bytes, from, to, line),
      open(kind, line) {
        if (part !== null && kind === 'object') {
          if (hdf5Objects.has(name)) layout = 'hdf5';
          return part.open(kind, line);
        }
        if (kind === 'array') return list(name, false);
        if (isOutermost && name === 'columns') return object(false);
        return passOver.open(kind, line);
      },
    };
  };
  const object = (isOutermost: boolean): JsonContainer => ({ child: (name) => member(name, isOutermost), close: () => undefined });

  const walk = createJsonWalk({
    scalar: () => refuse('JSON without an object'),
    open(kind) {
      isList = kind === 'array';
      return isList ? list('', true) : object(true);
    },
  });
  return { ...createJsonStructure(walk, reasons), layout: () => layout, isList: () => isList, header: () => columns.header() };
}
