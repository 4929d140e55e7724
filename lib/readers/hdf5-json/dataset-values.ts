import type { ColumnStore, StoredColumn } from '../column-store';
import type { JsonElement } from '../json/json-element';
import { listAsValue, type BadValue, type ScalarReader } from '../json/read-scalar';

const mostNoted = 1000;
/** Texts of the first values are kept for a preview. */
const mostShown = 320;
const longestShown = 60;

/** The values of one dataset in the order in which they are written, whatever lists they stand in. */
export interface DatasetValues {
  element: JsonElement;
  values: StoredColumn;
  digits(): number;
  /** What is no number has NaN among the values; the first of them, by their places, with their lines. */
  bad: ReadonlyMap<number, BadValue & { line: number }>;
  hasBad(): boolean;
  first: readonly string[];
  /** How many values the lists of each depth have, outermost first; null where lists of one depth differ. */
  lengths: readonly (number | null)[];
}

export interface ValueKeeping {
  store: ColumnStore;
  reader: ScalarReader;
  /** Only the first values are kept, as text. */
  keepsFirst: boolean;
}

export function createDatasetValues({ store, reader, keepsFirst }: ValueKeeping): DatasetValues {
  const values = store.addColumn();
  const bad = new Map<number, BadValue & { line: number }>();
  const first: string[] = [];
  const lengths: (number | null)[] = [];
  const known = new Set<number>();
  let digits = 0;
  let isBad = false;

  const noteBad = (line: number, value: BadValue) => {
    isBad = true;
    if (bad.size < mostNoted) bad.set(values.length(), { ...value, line });
    if (!keepsFirst) values.add(NaN);
  };
  const elements: JsonElement[] = [];
  const at = (depth: number): JsonElement => (elements[depth] ??= {
    scalar(kind, bytes, from, to, line) {
      if (keepsFirst && first.length < mostShown) first.push(bytes.toString('utf8', from, Math.min(to, from + longestShown)));
      const value = reader.read(kind, bytes, from, to);
      if (Number.isNaN(value)) {
        noteBad(line, reader.explain(kind, bytes, from, to));
        return;
      }
      if (!keepsFirst) values.add(value);
      if (reader.digits() > digits) digits = reader.digits();
    },
    open(kind, line) {
      if (kind === 'object') {
        noteBad(line, { ...listAsValue, found: 'an object' });
        return null;
      }
      let length = 0;
      return {
        child() {
          length += 1;
          return at(depth + 1);
        },
        close() {
          if (!known.has(depth)) lengths[depth] = length;
          else if (lengths[depth] !== length) lengths[depth] = null;
          known.add(depth);
        },
      };
    },
  });
  return { element: at(0), values, digits: () => digits, bad, hasBad: () => isBad, first, lengths };
}
