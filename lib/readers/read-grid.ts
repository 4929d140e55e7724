import { createHash } from 'node:crypto';
import type { ErrorMap } from '../numerics/maps/error-map';
import { createMapRoom } from '../numerics/maps/map-room';
import type { GridNorms } from '../numerics/norms/grid-norms';
import type { OpenHelper } from './table/chunk-helping';
import { compileExact } from './compile-exact';
import { prepareGathering } from './gather-grid';
import { createGridChecks, type GridChecks } from './grid-checks';
import type { GridReading } from './grid-reading';
import type { GridPart, GridTask } from './grid-task';
import { createGridTotal, type GridTotal } from './grid-total';
import { locateColumns } from './locate-columns';
import { planColumns } from './plan-columns';
import { readChunks } from './table/read-chunks';
import type { ColumnFormat } from './column-format';
import { readSource, type OpenSource } from './read-source';
import type { ByteSource, ReadProgress } from './source';
import { detectTableDialect } from './table/table-dialect';
import { createTableMemory } from './table/table-memory';
import { createTableWork, type TableTask } from './table/table-work';

export interface GridReadResult {
  norms: GridNorms;
  /** None where none are asked for. */
  maps: ErrorMap[];
  /** Of the bytes as stored, in lower-case hexadecimal. */
  sha256: string;
  bytes: number;
}

export interface GridReadOptions {
  onProgress?: (progress: ReadProgress) => void;
  signal?: AbortSignal;
  /** Starts a thread that helps with a large table; without it all is read in this one, to the same result. */
  openHelper?: (task: TableTask) => OpenHelper<GridPart>;
}

/** The columns of the file and their most significant digits, in the order of the plan. */
interface ColumnsRead { indices: number[]; digits: (number | null)[]; singles?: boolean[]; leftOut?: number }

interface Gathering { task: GridTask; checks: GridChecks; total: GridTotal; onPiece: () => void }

/**
 * Reads one grid in one pass: hash, decompression, columns, exact solution, norms, and where asked for those of parts of the domain and maps. Throws RejectedFile with every reason
 * where the file cannot be taken. Expressions that do not compile and fields without a column are misuse and throw TypeError.
 */
export async function readGrid(source: ByteSource, reading: GridReading, options: GridReadOptions = {}): Promise<GridReadResult> {
  const plan = planColumns(reading);
  const fields = reading.fields.map(({ field }) => field);
  const task: GridTask = { plan, fields, exact: compileExact(reading), average: reading.average, mesh: reading.mesh, rigid: reading.rigid, t: reading.t, bands: reading.bands, maps: reading.maps, mapRoom: reading.maps && createMapRoom(reading.maps) };
  const checks = createGridChecks(reading.t);
  const total = createGridTotal(task);
  const hash = createHash('sha256');
  let bytes = 0;
  const onBytes = (chunk: Uint8Array) => {
    hash.update(chunk);
    bytes += chunk.length;
  };
  const onPiece = () => options.onProgress?.({ rows: total.rows(), bytes });
  const gathering: Gathering = { task, checks, total, onPiece };

  const { indices, digits, singles, leftOut = 0 } = await readSource(source, {
    table: (opened) => readTableGrid(opened, { ...gathering, given: reading.mapping.table, openHelper: options.openHelper }),
    columns: (reader, { pieces }) => readColumnsGrid(reader, pieces, gathering),
  }, { onBytes, signal: options.signal });
  onPiece();
  if (total.rows() === 0 && checks.isClean()) {
    checks.rows.add({ code: 'too-few-rows', line: null, column: null, found: 'no row of numbers', expected: 'at least 1 row' });
  }
  checks.throwIfAny(plan.t === null ? undefined : indices[plan.t]);
  const found = total.finish(plan.fields.map((slot) => digits[slot] ?? null));
  if (found === null) throw new Error('readGrid: rows without a problem have no norms');
  const norms = noteSingles(found.norms, plan.fields.map((slot) => singles?.[slot] === true));
  return { ...found, norms: leftOut > 0 ? { ...norms, rowsLeftOut: leftOut } : norms, sha256: hash.digest('hex'), bytes };
}

/** Marks the fields that the file stores as float32. */
function noteSingles(norms: GridNorms, isSingle: readonly boolean[]): GridNorms {
  return isSingle.some(Boolean) ? { ...norms, fields: norms.fields.map((field, at) => (isSingle[at] === true ? { ...field, storedAs: 'single' } : field)) } : norms;
}

async function readColumnsGrid(
  reader: ColumnFormat, pieces: AsyncIterable<Buffer>, { task, checks, total, onPiece }: Gathering,
): Promise<ColumnsRead> {
  const gatherer = prepareGathering(task)(checks);
  const { columns, leftOut } = await reader.read(pieces, { wanted: task.plan.names, reasons: checks.rows, onBatch: (batch) => gatherer.add(batch), onPiece });
  const indices = columns.map(({ index }) => index);
  total.add(gatherer.finish(indices));
  return { indices, digits: columns.map(({ significantDigits }) => significantDigits), singles: columns.map(({ isSingle }) => isSingle === true), leftOut };
}

interface TableGathering extends Gathering { given: GridReading['mapping']['table']; openHelper: GridReadOptions['openHelper'] }

async function readTableGrid(
  { pieces, head }: OpenSource, { task: grid, checks, total, onPiece, given, openHelper }: TableGathering,
): Promise<ColumnsRead> {
  const dialect = detectTableDialect(head, given);
  const indices = locateColumns(dialect.header, grid.plan.names, dialect.headerLine, checks.rows);
  const task: TableTask = { dialect, indices, grid };
  const memory = createTableMemory();
  const work = createTableWork(task, checks, memory);
  const digits = await readChunks(pieces, {
    dialect, memory, work, checks, openHelper: openHelper && ((shared) => openHelper({ ...task, grid: total.taskOfHelper() })(shared)),
    onPart(part) {
      total.add(part);
      onPiece();
    },
  });
  return { indices, digits };
}
