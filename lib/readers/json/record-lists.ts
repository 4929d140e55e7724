import { refuseManyColumns } from '../column-limit';
import type { JsonContainer, JsonElement } from './json-element';
import type { JsonScalar } from './json-structure';

/** What takes the records of one list. Names of nested values are paths, joined by `.`; those in lists have their place in brackets. */
export interface RecordSink {
  begin(line: number): void;
  value(path: string, kind: JsonScalar, bytes: Buffer, from: number, to: number, line: number): void;
  end(): void;
  /** Something else stands where a record should. */
  other(line: number): void;
}

/** What takes the items of a list of records. */
export function createRecordList(sink: RecordSink): JsonElement {
  const containers = new Map<string, JsonContainer>();
  let path = '';
  const leaf: JsonElement = {
    scalar: (kind, bytes, from, to, line) => sink.value(path, kind, bytes, from, to, line),
    open: (kind) => within(`${kind} ${path}`, kind, path),
  };
  const within = (key: string, kind: 'object' | 'array', prefix: string): JsonContainer => {
    const known = containers.get(key);
    if (known) return known;
    const made: JsonContainer = {
      child(name, index) {
        path = kind === 'array' ? `${prefix}[${index}]` : prefix === '' ? name : `${prefix}.${name}`;
        return leaf;
      },
      close: () => undefined,
    };
    containers.set(key, made);
    // Records that never have the same names would fill memory with them.
    refuseManyColumns(containers.size);
    return made;
  };
  const record = within('object ', 'object', '');
  const whole: JsonContainer = { child: (name, index) => record.child(name, index), close: () => sink.end() };
  return {
    scalar: (_kind, _bytes, _from, _to, line) => sink.other(line),
    open(kind, line) {
      if (kind === 'array') {
        sink.other(line);
        return null;
      }
      sink.begin(line);
      return whole;
    },
  };
}
