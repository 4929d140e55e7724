import type { RejectionCode } from '../domain/uploads/rejection';
import type { Head } from './read-head';
import { RejectedFile } from './rejected-file';
import type { SourceFormat } from './source';

const readable = 'a text table, JSON with one array of numbers per column, with records, or in the HDF5/JSON layout, HDF5, or VTK XML of a grid';

const hdf5Signature = Buffer.from('\x89HDF\r\n\x1a\n', 'latin1');

const signatures: readonly { bytes: string; name: string }[] = [
  { bytes: 'CDF\x01', name: 'netCDF' },
  { bytes: 'CDF\x02', name: 'netCDF' },
  { bytes: 'CDF\x05', name: 'netCDF' },
  { bytes: '\x93NUMPY', name: 'a numpy array' },
  { bytes: 'PK\x03\x04', name: 'a ZIP archive or a spreadsheet' },
  { bytes: '\x1f\x8b', name: 'a compressed file inside another' },
  { bytes: 'BZh', name: 'bzip2' },
  { bytes: '\xfd7zXZ', name: 'xz' },
  { bytes: '\x28\xb5\x2f\xfd', name: 'Zstandard' },
  { bytes: '%PDF', name: 'PDF' },
  { bytes: '# vtk DataFile', name: 'legacy VTK' },
  { bytes: '\xff\xfe', name: 'UTF-16 text' },
  { bytes: '\xfe\xff', name: 'UTF-16 text' },
];

/** Tells by the content what a file is. Throws RejectedFile for what is empty, binary or in a format that is not read. */
export function sniffFormat(head: Head): SourceFormat {
  if (isHdf5(head.bytes)) return 'hdf5';
  const text = head.bytes.toString('latin1', 0, 4096);
  const signature = signatures.find(({ bytes }) => text.startsWith(bytes));
  if (signature !== undefined) throw rejected('unsupported-format', signature.name);

  const content = text.replace(/^\xef\xbb\xbf/, '').trimStart();
  if (content === '' && head.complete && head.bytes.toString('latin1').trim() === '') throw rejected('empty-file', `${head.bytes.length} bytes`);
  // Appended data may be raw bytes.
  if (/^(?:<\?xml\s[^>]*\?>)?\s*<VTKFile\s/.test(content.replaceAll(/<!--[^]*?-->/g, ''))) return 'vtk';
  if (head.bytes.includes(0)) throw rejected('binary-content', 'null bytes');
  if (/^<(?:\?xml|!)/i.test(content)) throw rejected('unsupported-format', 'XML or HTML');
  return content.startsWith('{') || content.startsWith('[') ? 'json' : 'table';
}

/** At the beginning, or behind a block of the user's own of 512 bytes, 1024 and so on (HDF5 file format specification, II.A). */
function isHdf5(bytes: Buffer): boolean {
  for (let at = 0; at + hdf5Signature.length <= bytes.length; at = at === 0 ? 512 : at * 2) {
    if (bytes.subarray(at, at + hdf5Signature.length).equals(hdf5Signature)) return true;
  }
  return false;
}

function rejected(code: RejectionCode, found: string): RejectedFile {
  return new RejectedFile([{ code, count: 1, line: null, column: null, found, expected: readable }]);
}
