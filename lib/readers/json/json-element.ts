import type { JsonEvents, JsonScalar } from './json-structure';

/** A scalar as written: `bytes[from, to)`, a text without its quotes. */
export type ScalarTaker = (kind: JsonScalar, bytes: Buffer, from: number, to: number, line: number) => void;

/** What takes one value of a document. */
export interface JsonElement {
  scalar: ScalarTaker;
  /** What takes the children of a list or an object; null passes all of it over. */
  open(kind: 'object' | 'array', line: number): JsonContainer | null;
}

export interface JsonContainer {
  /** What takes the child of that name, or of that place in a list (then the name is ''); null passes it over. */
  child(name: string, index: number): JsonElement | null;
  close(): void;
}

/** Leads what a document is made of to the elements that take it, from the outermost inward. */
export function createJsonWalk(outermost: JsonElement): JsonEvents {
  const open: (JsonContainer | null)[] = [];
  const counts: number[] = [];
  let top: JsonContainer | null = null;
  let depth = 0;
  let name = '';

  const next = (): JsonElement | null => {
    if (depth === 0) return outermost;
    const index = counts[depth - 1] as number;
    counts[depth - 1] = index + 1;
    return top === null ? null : top.child(name, index);
  };
  return {
    open(kind, line) {
      const element = next();
      name = '';
      top = element === null ? null : element.open(kind, line);
      open[depth] = top;
      counts[depth] = 0;
      depth += 1;
    },
    close() {
      top?.close();
      depth -= 1;
      top = depth === 0 ? null : open[depth - 1] as JsonContainer | null;
      name = '';
    },
    key(found) {
      name = found;
    },
    scalar(kind, bytes, from, to, line) {
      next()?.scalar(kind, bytes, from, to, line);
    },
  };
}

const nothing = () => undefined;

/** Takes the scalars of a list, and of the lists in it, in their order. */
export const passOver: JsonElement = { scalar: nothing, open: () => null };
