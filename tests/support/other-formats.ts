import { writeHdf5 } from './hdf5';
import { writeHdf5Json } from './hdf5-json';

/** A table as its file prints it: names, and the numbers of each column as written. */
export interface PrintedTable { names: string[]; columns: string[][] }

/** Reads a plain table of commas, as the solver sets are. */
export function parsePrinted(csv: string): PrintedTable {
  const [head = '', ...lines] = csv.trimEnd().split('\n');
  const names = head.split(',');
  const columns = names.map((): string[] => []);
  for (const line of lines) line.split(',').forEach((value, at) => columns[at]?.push(value));
  return { names, columns };
}

const quoted = (name: string) => JSON.stringify(name);
const doubles = (column: readonly string[]) => Float64Array.from(column, Number);

/** The same table in every format that is not a table of text; in text formats with the very digits. */
export const otherFormats: Readonly<Record<string, (table: PrintedTable) => string | Promise<Buffer>>> = {
  'JSON columns': ({ names, columns }) => `{${names.map((name, at) => `${quoted(name)}:[${columns[at]?.join(',')}]`).join(',\n')}}`,
  'JSON records': ({ names, columns }) => `[${(columns[0] ?? []).map((_, row) => `{${names.map((name, at) => `${quoted(name)}:${columns[at]?.[row]}`).join(',')}}`).join(',\n')}]`,
  'HDF5/JSON': ({ names, columns }) => writeHdf5Json(names.map((name, at) => ({ path: `fields/${name}`, value: columns[at]?.map(Number) })), { linksLast: true }),
  'HDF5': ({ names, columns }) => writeHdf5(names.map((name, at) => ({ path: `fields/${name}`, data: doubles(columns[at] ?? []) }))),
  'HDF5 in packed chunks': ({ names, columns }) => writeHdf5(names.map((name, at) => ({
    path: `fields/${name}`, data: doubles(columns[at] ?? []), chunks: [Math.max(1, Math.floor((columns[0]?.length ?? 1) / 3))], compression: 4,
  }))),
};
