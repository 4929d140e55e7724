import type { Fail } from './array-payload';
import { lengthAlong, type GridKind, type Piece } from './grid-file';

export type Attributes = Readonly<Record<string, string>>;

const kinds: readonly GridKind[] = ['UnstructuredGrid', 'RectilinearGrid', 'StructuredGrid', 'ImageData'];

export interface FileForm {
  kind: GridKind;
  lengthBytes: 4 | 8;
  littleEndian: boolean;
  isCompressed: boolean;
}

/** Of the outermost tag. `refuse` is told what is not read, and what would be. */
export function readFileForm(attributes: Attributes, refuse: Fail): FileForm {
  const { type = 'nothing', byte_order: order = 'LittleEndian', header_type: header = 'UInt32', compressor = '' } = attributes;
  const kind = kinds.find((each) => each === type);
  if (kind === undefined) return refuse(`VTK XML of ${type.startsWith('P') && kinds.some((each) => type === `P${each}`) ? 'the names of other files' : type}`, `a VTK file of one of ${kinds.join(', ')}`);
  if (order !== 'LittleEndian' && order !== 'BigEndian') return refuse(`VTK XML with byte_order ${order}`, 'it with LittleEndian or BigEndian');
  if (header !== 'UInt32' && header !== 'UInt64') return refuse(`VTK XML with header_type ${header}`, 'it with UInt32 or UInt64');
  if (compressor !== '' && compressor !== 'vtkZLibDataCompressor') return refuse(`VTK XML packed by ${compressor}`, 'it packed by vtkZLibDataCompressor, or not packed');
  return { kind, lengthBytes: header === 'UInt32' ? 4 : 8, littleEndian: order === 'LittleEndian', isCompressed: compressor !== '' };
}

export function readPiece(kind: GridKind, attributes: Attributes, fail: Fail): Piece {
  if (kind === 'UnstructuredGrid') {
    return { points: readCount(attributes, 'NumberOfPoints', fail), cells: readCount(attributes, 'NumberOfCells', fail), extent: null };
  }
  const extent = readNumbers(attributes, 'Extent', 6, fail);
  const lengths = [0, 1, 2].map((axis) => lengthAlong(extent, axis));
  if (extent.some((each) => !Number.isInteger(each)) || lengths.some((length) => length < 1)) fail(`Extent “${attributes.Extent ?? ''}”`, 'six whole numbers, first and last in turn');
  const points = product(lengths);
  if (points > Number.MAX_SAFE_INTEGER) fail(`Extent “${attributes.Extent ?? ''}”`, 'a grid that can be counted');
  return { points, cells: product(lengths.map((length) => Math.max(1, length - 1))), extent };
}

export function readImage(attributes: Attributes, fail: Fail): { origin: number[]; spacing: number[] } {
  const { Origin = '0 0 0', Spacing = '1 1 1', Direction = '1 0 0 0 1 0 0 0 1' } = attributes;
  const numbers = { Origin, Spacing, Direction };
  if (readNumbers(numbers, 'Direction', 9, fail).some((each, at) => each !== Number(at % 4 === 0))) fail(`Direction “${Direction}”`, '“1 0 0 0 1 0 0 0 1”');
  return { origin: readNumbers(numbers, 'Origin', 3, fail), spacing: readNumbers(numbers, 'Spacing', 3, fail) };
}

/** A whole number that may be absent where a value for that is given. */
export function readCount(attributes: Attributes, name: string, fail: Fail, absent?: number): number {
  const text = attributes[name]?.trim();
  if ((text === undefined || text === '') && absent !== undefined) return absent;
  if (text === undefined || !/^\d{1,15}$/.test(text)) return fail(text === undefined ? `no ${name}` : `${name} “${text}”`, `${name} as a whole number`);
  return Number(text);
}

function readNumbers(attributes: Attributes, name: string, count: number, fail: Fail): number[] {
  const numbers = (attributes[name] ?? '').trim().split(/\s+/).map(Number);
  return numbers.length === count && numbers.every(Number.isFinite) ? numbers : fail(`${name} “${attributes[name] ?? ''}”`, `${count} numbers in ${name}`);
}

const product = (numbers: readonly number[]): number => numbers.reduce((all, each) => all * each, 1);
