import type { ReaderMapping } from '../domain/columns/column-mapping';
import { createNormTotal } from '../numerics/norms/combine-norms';
import type { FieldNorms } from '../numerics/norms/grid-norms';
import { createNormGatherer } from '../numerics/norms/norm-gatherer';
import { createColumnStore, type ColumnStore, type StoredColumn } from './column-store';
import { readColumns, type ColumnsOfFile } from './read-columns';
import { createReasonCollector, rejectAtOnce } from './reason-collector';
import type { ByteSource, ColumnBatch, ReadProgress } from './source';

export interface DifferenceReading {
  dimension: 1 | 2 | 3;
  fields: readonly string[];
  /** Of each file. */
  fine: ReaderMapping;
  coarse: ReaderMapping;
}

export interface DifferenceResult {
  /** e is the solution of the fine grid minus that of the coarse one, by the weights of the fine grid. */
  fields: FieldNorms[];
  /** Of the bytes as stored, in lower-case hexadecimal. */
  sha256: { fine: string; coarse: string };
}

const batchRows = 2048;
const axes = ['x', 'y', 'z'] as const;
/** Of the extent of the points: the same point, printed with other digits. */
const samePoint = 1e-7;

/**
 * Norms of the difference of two solutions on the same points in the same order: the coarse file waits in a column store
 * while the fine one is read. Throws RejectedFile where a file cannot be taken, and with `points-differ` where the points
 * are not the same.
 */
export async function readDifference(
  files: { fine: ByteSource; coarse: ByteSource }, reading: DifferenceReading, onProgress: (progress: ReadProgress) => void = () => undefined,
): Promise<DifferenceResult> {
  const store = createColumnStore();
  try {
    const kept = await keepColumns(files.coarse, { reading, store, onProgress });
    const differences = createDifferences(reading, kept);
    const fine = await readColumns(files.fine, { names: [...namesOf(reading, reading.fine), ...weightOf(reading.fine)], given: reading.fine.table, onBatch: (batch) => differences.add(batch), onProgress });
    return { fields: differences.finish(), sha256: { fine: fine.sha256, coarse: kept.file.sha256 } };
  } finally {
    store.close();
  }
}

const axesOf = ({ dimension }: DifferenceReading) => axes.slice(0, dimension);

function namesOf(reading: DifferenceReading, mapping: ReaderMapping): string[] {
  return [...axesOf(reading).map((axis) => mapping[axis]), ...reading.fields.map((field) => mapping.fields[field])].map((name, index) => {
    if (name === undefined) throw new TypeError(`readDifference: the mapping has no column ${index + 1}`);
    return name;
  });
}

const weightOf = ({ weight }: ReaderMapping): string[] => (weight === null ? [] : [weight]);

interface Kept { file: ColumnsOfFile; columns: StoredColumn[]; extent: number }
interface Keeping { reading: DifferenceReading; store: ColumnStore; onProgress: (progress: ReadProgress) => void }

async function keepColumns(source: ByteSource, { reading, store, onProgress }: Keeping): Promise<Kept> {
  const names = namesOf(reading, reading.coarse);
  const columns = names.map(() => store.addColumn());
  const lowest = axesOf(reading).map(() => Infinity);
  const highest = lowest.map(() => -Infinity);
  const file = await readColumns(source, {
    names, given: reading.coarse.table, onProgress,
    onBatch(batch) {
      for (const [slot, column] of columns.entries()) column.addAll(batch.columns[slot] as Float64Array, batch.rows);
      for (const axis of lowest.keys()) {
        const values = batch.columns[axis] as Float64Array;
        for (let i = 0; i < batch.rows; i += 1) {
          const value = values[i] as number;
          if (value < (lowest[axis] as number)) lowest[axis] = value;
          if (value > (highest[axis] as number)) highest[axis] = value;
        }
      }
    },
  });
  return { file, columns, extent: Math.max(...lowest.map((low, axis) => (highest[axis] as number) - low)) };
}

function createDifferences(reading: DifferenceReading, { file, columns, extent }: Kept) {
  const { dimension, fields } = reading;
  const reasons = createReasonCollector();
  const gatherer = createNormGatherer(fields);
  const coarse = columns.map(() => new Float64Array(batchRows));
  let rows = 0;

  const refuse = (found: string, expected: string, line: number | null = null) => rejectAtOnce(reasons, { code: 'points-differ', line, column: null, found, expected });
  const refuseRows = (found: number) => refuse(`${found} rows`, `${file.rows} rows, as on the coarser grid`);
  const checkPoints = (batch: ColumnBatch) => {
    for (let axis = 0; axis < dimension; axis += 1) {
      const [own, other] = [batch.columns[axis] as Float64Array, coarse[axis] as Float64Array];
      for (let i = 0; i < batch.rows; i += 1) {
        if (Math.abs((own[i] as number) - (other[i] as number)) <= samePoint * extent) continue;
        refuse(`${axes[axis]} = ${own[i]} in row ${rows + i + 1}`, `${axes[axis]} = ${other[i]}, as on the coarser grid`, batch.lines?.[i] ?? null);
      }
    }
  };

  return {
    add(batch: ColumnBatch) {
      if (rows + batch.rows > file.rows) refuseRows(rows + batch.rows);
      for (const [slot, column] of columns.entries()) column.copy(rows, batch.rows, coarse[slot] as Float64Array);
      checkPoints(batch);
      const [x, y, z] = axes.map((_, axis) => (axis < dimension ? batch.columns[axis] as Float64Array : null));
      gatherer.add({
        rows: batch.rows, x: x as Float64Array, y: y ?? null, z: z ?? null, weights: batch.columns[dimension + fields.length] ?? null,
        fields: fields.map((_, index) => ({ values: batch.columns[dimension + index] as Float64Array, exact: coarse[dimension + index] as Float64Array })),
      });
      rows += batch.rows;
    },
    finish(): FieldNorms[] {
      if (rows < file.rows) refuseRows(rows);
      const [problem] = gatherer.problems();
      if (problem) throw new Error(`readDifference: ${problem.code} of ${problem.field ?? 'the weight'} in row ${problem.row + 1}, which was read without a fault before`);
      const total = createNormTotal(fields);
      total.add(gatherer.part());
      return total.finish(fields.map(() => null))?.fields ?? [];
    },
  };
}
