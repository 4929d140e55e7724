import { deflateSync } from 'node:zlib';

const sizes = { Int8: 1, UInt8: 1, Int16: 2, UInt16: 2, Int32: 4, UInt32: 4, Int64: 8, UInt64: 8, Float32: 4, Float64: 8 } as const;
export type VtkType = keyof typeof sizes;
export const vtkTypes = Object.keys(sizes) as VtkType[];

export interface VtkArray { name: string; type?: VtkType; components?: number; values: readonly number[] }

type VtkSection = 'PointData' | 'CellData' | 'Points' | 'Cells' | 'Coordinates' | 'FieldData';

export interface VtkPiece {
  attributes: Record<string, string | number>;
  sections: Partial<Record<VtkSection, VtkArray[]>>;
}

export interface VtkGrid {
  kind: 'UnstructuredGrid' | 'RectilinearGrid' | 'StructuredGrid' | 'ImageData';
  attributes?: Record<string, string | number>;
  time?: number;
  pieces: VtkPiece[];
}

export interface VtkForm {
  encoding: 'ascii' | 'inline' | 'base64' | 'raw';
  /** Bytes of a block before packing; not packed where absent. */
  block?: number;
  header?: 'UInt32' | 'UInt64';
  bigEndian?: boolean;
  /** Writes appended arrays from the last to the first, with bytes of nobody between. */
  shuffled?: boolean;
}

type Form = Required<Omit<VtkForm, 'block'>> & Pick<VtkForm, 'block'>;

const attributesOf = (attributes: Record<string, string | number | undefined>): string => (
  Object.entries(attributes).map(([name, value]) => (value === undefined ? '' : ` ${name}="${value}"`)).join(''));

function putValue(view: DataView, at: number, { type, value, littleEndian }: { type: VtkType; value: number; littleEndian: boolean }): void {
  if (type === 'Int64' || type === 'UInt64') view.setBigInt64(at, BigInt(value), littleEndian);
  else view[`set${type.replace('UI', 'Ui') as 'Int16'}`](at, value, littleEndian);
}

function bytesOf({ type = 'Float64', values }: VtkArray, littleEndian: boolean): Buffer {
  const bytes = Buffer.alloc(values.length * sizes[type]);
  const view = new DataView(bytes.buffer, bytes.byteOffset, bytes.length);
  for (const [at, value] of values.entries()) putValue(view, at * sizes[type], { type, value, littleEndian });
  return bytes;
}

/** Lengths first, data after them, as the format has it; in base64 the lengths of blocks stand by themselves. */
function packed(data: Buffer, { block, header, bigEndian, encoding }: Form): Buffer {
  const lengths = (values: number[]) => bytesOf({ name: '', type: header, values }, !bigEndian);
  const isText = encoding === 'inline' || encoding === 'base64';
  const parts = block === undefined ? [Buffer.concat([lengths([data.length]), data])] : packedBlocks(data, block, lengths);
  return isText ? Buffer.from(parts.map((part) => part.toString('base64')).join(''), 'latin1') : Buffer.concat(parts);
}

function packedBlocks(data: Buffer, block: number, lengths: (values: number[]) => Buffer): Buffer[] {
  const blocks = Array.from({ length: Math.ceil(data.length / block) }, (_, at) => deflateSync(data.subarray(at * block, (at + 1) * block)));
  return [lengths([blocks.length, block, data.length % block, ...blocks.map(({ length }) => length)]), Buffer.concat(blocks)];
}

/** A VTK XML file as the format describes it, written without looking at how it is read. */
export function writeVtk({ kind, attributes = {}, time, pieces }: VtkGrid, given: VtkForm): Buffer {
  const form: Form = { header: 'UInt32', bigEndian: false, shuffled: false, ...given };
  const isAppended = form.encoding === 'base64' || form.encoding === 'raw';
  const list: Buffer[] = [];
  const all = [...(time === undefined ? [] : [{ name: 'TimeValue', values: [time] }]), ...pieces.flatMap(({ sections }) => Object.values(sections).flat())];
  const data = isAppended ? all.map((array) => packed(bytesOf(array, !form.bigEndian), form)) : [];
  const offsets = new Map<VtkArray, number>();
  let end = 0;
  const order = form.shuffled ? [...all.keys()].reverse() : [...all.keys()];
  for (const at of order) {
    const gap = Buffer.from(form.shuffled ? '<!' : '', 'latin1');
    offsets.set(all[at] as VtkArray, end + gap.length);
    list.push(gap, data[at] ?? Buffer.alloc(0));
    end += gap.length + (data[at]?.length ?? 0);
  }
  const tagOf = (array: VtkArray): string => {
    const { name, type = 'Float64', components, values } = array;
    const own = { type, Name: name, NumberOfComponents: components };
    if (isAppended) return `<DataArray${attributesOf({ ...own, format: 'appended', offset: offsets.get(array) })}/>\n`;
    const text = form.encoding === 'ascii' ? values.map(String).reduce((rest, value, at) => `${rest}${at % 6 === 0 ? '\n' : ' '}${value}`, '') : packed(bytesOf(array, !form.bigEndian), form).toString('latin1');
    return `<DataArray${attributesOf({ ...own, format: form.encoding === 'ascii' ? 'ascii' : 'binary' })}>\n${text}\n</DataArray>\n`;
  };
  const sectionOf = (name: string, arrays: VtkArray[]) => `<${name}>\n${arrays.map(tagOf).join('')}</${name}>\n`;
  const body = pieces.map((piece) => `<Piece${attributesOf(piece.attributes)}>\n${Object.entries(piece.sections).map(([name, arrays]) => sectionOf(name, arrays)).join('')}</Piece>\n`).join('');
  const top = { type: kind, version: '1.0', byte_order: form.bigEndian ? 'BigEndian' : 'LittleEndian', header_type: form.header, compressor: form.block === undefined ? undefined : 'vtkZLibDataCompressor' };
  const head = `<?xml version="1.0"?>\n<VTKFile${attributesOf(top)}>\n<${kind}${attributesOf(attributes)}>\n${time === undefined ? '' : sectionOf('FieldData', all.slice(0, 1))}${body}</${kind}>\n`;
  return Buffer.concat([
    Buffer.from(head), ...(isAppended ? [Buffer.from(`<AppendedData encoding="${form.encoding}">\n_`), ...list, Buffer.from('\n</AppendedData>\n')] : []),
    Buffer.from('</VTKFile>\n'),
  ]);
}

/** A piece of an unstructured grid: cells as [type, points], values of cells and points by name. */
export function unstructuredPiece(
  points: readonly (readonly number[])[], cells: readonly (readonly [number, readonly number[]])[], data: { cells?: VtkArray[]; points?: VtkArray[] } = {},
): VtkPiece {
  let end = 0;
  return {
    attributes: { NumberOfPoints: points.length, NumberOfCells: cells.length },
    sections: {
      PointData: data.points ?? [], CellData: data.cells ?? [],
      Points: [{ name: 'Points', components: 3, values: points.flat() }],
      Cells: [
        { name: 'connectivity', type: 'Int64', values: cells.flatMap(([, corners]) => corners) },
        { name: 'offsets', type: 'Int64', values: cells.map(([, corners]) => (end += corners.length)) },
        { name: 'types', type: 'UInt8', values: cells.map(([type]) => type) },
      ],
    },
  };
}
