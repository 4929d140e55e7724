import type { ColumnStore } from '../column-store';
import { createExpansionLimit } from '../expansion-limit';
import { rejectAtOnce, type ReasonCollector } from '../reason-collector';
import { createAppendedData, type AppendedArray, type AppendedData } from './appended-data';
import type { Fail, PayloadForm } from './array-payload';
import type { ArrayReader, LineAt } from './array-reader';
import { openSegment, type Encoding } from './array-segment';
import { arrayKey, describeArray, type ArrayName, type GridFile, type StoredArray } from './grid-file';
import { createGridTags, type ArrayTag } from './grid-tags';
import { createMarkup } from './markup';

export interface ArraysAsked {
  store: ColumnStore;
  reasons: ReasonCollector;
  /** How many values are to be kept of an array in a piece: Infinity for all, 0 for none. */
  keep: (array: ArrayName, file: GridFile, piece: number) => number;
  onPiece: () => void;
  /** Whether nothing after the first piece is asked for. */
  firstPieceOnly: boolean;
}

/** Reads what is asked for of a VTK file into the store. Throws RejectedFile for what is out of place. */
export async function collectArrays(pieces: AsyncIterable<Buffer>, asked: ArraysAsked): Promise<GridFile> {
  const collector = createCollector(asked);
  try {
    for await (const bytes of pieces) {
      await collector.push(bytes);
      asked.onPiece();
      if (collector.isEnough()) return collector.file;
    }
    collector.end();
    return collector.file;
  } finally {
    collector.drop();
  }
}

function createCollector({ store, reasons, keep, firstPieceOnly }: ArraysAsked) {
  const file: GridFile = { kind: 'UnstructuredGrid', pieces: [], listed: [], arrays: new Map(), image: null };
  const expansion = createExpansionLimit();
  const waiting: { tag: ArrayTag; line: number }[] = [];
  let form: PayloadForm = { lengthBytes: 4, littleEndian: true, isCompressed: false, expansion };
  let reader: ArrayReader | null = null;
  /** Tags open inside the array: only its own text is numbers. */
  let inside = 0;
  let ended: ArrayReader | null = null;
  let pieceDone = false;
  let appended: AppendedData | null = null;

  const failAt = (line: number | null): Fail => (found, expected) => rejectAtOnce(reasons, { code: 'malformed-vtk', line, column: null, found, expected });
  const refuse: Fail = (found, expected) => rejectAtOnce(reasons, { code: 'unsupported-format', line: null, column: null, found, expected });

  const arrayOf = (name: ArrayName): StoredArray => {
    const known = file.arrays.get(arrayKey(name));
    if (known !== undefined) return known;
    const array: StoredArray = { ...name, values: store.addColumn(), segments: [], digits: 0, isSingle: false, word: null };
    file.arrays.set(arrayKey(name), array);
    return array;
  };

  /** Null where nothing of the array is asked for, or it has no values. */
  const open = ({ name, type, expected, piece }: ArrayTag, encoding: Encoding, line: number | null): ArrayReader | null => {
    const kept = keep(name, file, piece);
    if (kept === 0) return null;
    const array = arrayOf(name);
    const fail: Fail = (found, wanted) => failAt(line)(`${found} in ${describeArray(name, piece)}`, wanted);
    if (array.components !== name.components) fail(`${name.components} components`, `${array.components}, as in the first piece`);
    if (array.segments[piece] !== undefined) fail('the array a second time', 'it once');
    array.segments[piece] = { from: array.values.length(), length: 0 };
    return expected === 0 ? null : openSegment(array, { piece, type, encoding, form, expected, keep: kept, fail });
  };

  const openAppended = (encoding: 'base64' | 'raw'): AppendedData => {
    const arrays = waiting.flatMap(({ tag, line }): AppendedArray[] => {
      if (keep(tag.name, file, tag.piece) === 0) return [];
      const fail: Fail = (found, wanted) => failAt(line)(`${found} in ${describeArray(tag.name, tag.piece)}`, wanted);
      if (tag.expected === 0) {
        open(tag, 'appended raw', line);
        return [];
      }
      return [{ offset: tag.offset, fail, open: () => open(tag, encoding === 'raw' ? 'appended raw' : 'appended base64', line) ?? fail('nothing', 'numbers') }];
    });
    return createAppendedData(arrays, failAt(null));
  };

  const tags = createGridTags(file, {
    form: (found) => {
      form = { ...found, expansion };
    },
    array(tag, line) {
      if (reader !== null) failAt(line)('an array before the end of another', '</DataArray>');
      if (tag.encoding === 'appended') waiting.push({ tag, line });
      else reader = open(tag, tag.encoding, line);
      inside = 0;
    },
    arrayEnd() {
      ended = reader;
      reader = null;
    },
    pieceEnd() {
      pieceDone = true;
    },
    appendedData(encoding) {
      appended = openAppended(encoding);
      markup.leaveMarkup();
    },
    refuse, failAt,
  });

  const markup = createMarkup({
    open(name, attributes, line) {
      if (reader !== null) inside += 1;
      tags.open(name, attributes, line);
    },
    close(name) {
      if (reader !== null) inside -= 1;
      tags.close(name);
    },
    async settle() {
      const complete = ended;
      ended = null;
      await complete?.end();
    },
    text: (bytes: Buffer, from: number, to: number, lineAt: LineAt) => (reader !== null && inside === 0 ? reader.push(bytes, from, to, lineAt) : undefined),
    raw: (bytes) => appended?.push(bytes),
    fail: (line, found, expected) => failAt(line)(found, expected),
  });

  return {
    file,
    async push(bytes: Buffer) {
      expansion.noteStored(bytes.length);
      await markup.push(bytes);
    },
    isEnough: () => firstPieceOnly && (appended?.isDone() ?? (pieceDone && waiting.length === 0)),
    end() {
      markup.end();
      appended?.end();
    },
    drop() {
      (reader ?? ended)?.drop();
      appended?.drop();
    },
  };
}
