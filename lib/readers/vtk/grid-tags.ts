import { refuseManyColumns } from '../column-limit';
import type { Fail } from './array-payload';
import type { Encoding } from './array-segment';
import { expectedValues, type ArrayName, type GridFile, type Section } from './grid-file';
import { readCount, readFileForm, readImage, readPiece, type Attributes, type FileForm } from './read-attributes';
import { findValueType, type ValueType } from './value-type';

/** An array of numbers as its tag tells of it. */
export interface ArrayTag {
  name: ArrayName;
  type: ValueType;
  encoding: Encoding | 'appended';
  offset: number;
  expected: number | null;
  /** Counted from 0. */
  piece: number;
}

export interface TagEvents {
  form(form: FileForm): void;
  array(tag: ArrayTag, line: number): void;
  arrayEnd(): void;
  pieceEnd(): void;
  appendedData(encoding: 'base64' | 'raw'): void;
  /** What is read in no file of this kind. */
  refuse: Fail;
  failAt(line: number): Fail;
}

export interface GridTags {
  open(name: string, attributes: Attributes, line: number): void;
  close(name: string): void;
}

const sections: readonly Section[] = ['PointData', 'CellData', 'Points', 'Cells', 'Coordinates', 'FieldData'];
/** What no array holds; keys with information may stand in one. */
const ofGrid: ReadonlySet<string> = new Set(['VTKFile', 'Piece', 'DataArray', 'AppendedData', 'UnstructuredGrid', 'RectilinearGrid', 'StructuredGrid', 'ImageData', ...sections]);
const axisNames = ['x', 'y', 'z'];
const mostPieces = 100_000;
const mostArrays = 500_000;

/** Follows the tags of a VTK file and fills in what they say of the grid. */
export function createGridTags(file: GridFile, events: TagEvents): GridTags {
  const stack: string[] = [];
  let section: Section | null = null;
  let axes = 0;
  let arrays = 0;
  const listed = new Set<string>();

  const openArray = (attributes: Attributes, line: number) => {
    if (section === null) return;
    const fail = events.failAt(line);
    const type = findValueType(attributes.type);
    if (type === undefined) {
      if (isData(section)) return;
      events.refuse(`VTK XML with ${section} of type ${attributes.type ?? 'nothing'}`, 'it with numbers of Int8 to UInt64, Float32 or Float64');
    }
    const name: ArrayName = { section, name: nameOf(section, attributes, axes), components: componentsOf(section, attributes, fail) };
    if (section === 'Coordinates') axes += 1;
    arrays += 1;
    if (arrays > mostArrays) fail(`more than ${mostArrays} arrays`, 'fewer pieces');
    if (isData(section) && file.pieces.length <= 1) list(name, fail);
    const piece = Math.max(0, file.pieces.length - 1);
    const expected = expectedValues(name, file.pieces[piece] ?? { points: 0, cells: 0, extent: null });
    events.array({ name, type, encoding: encodingOf(attributes, events.refuse), offset: readCount(attributes, 'offset', fail, 0), expected, piece }, line);
  };

  const list = (array: ArrayName, fail: Fail) => {
    const key = `${array.section}/${array.name}`;
    if (listed.has(key)) fail(`another array “${array.name}” in ${array.section}`, 'a name of its own for each array');
    listed.add(key);
    file.listed.push(array);
    refuseManyColumns(file.listed.reduce((all, { components }) => all + components, 0));
  };

  return {
    open(name, attributes, line) {
      const parent = stack.at(-1);
      if (ofGrid.has(name) && stack.includes('DataArray')) events.failAt(line)(`<${name}> inside an array`, 'the end of the array');
      if (stack.length === 0) {
        if (name !== 'VTKFile') events.refuse(`XML of <${name}>`, '<VTKFile>');
        const form = readFileForm(attributes, events.refuse);
        file.kind = form.kind;
        events.form(form);
      } else if (stack.length === 1 && name === file.kind && name === 'ImageData') file.image = readImage(attributes, events.failAt(line));
      else if (name === 'AppendedData' && stack.length === 1) {
        const { encoding } = attributes;
        if (encoding !== 'base64' && encoding !== 'raw') events.refuse(`VTK XML with appended data as ${encoding ?? 'nothing'}`, 'it as base64 or raw');
        else events.appendedData(encoding);
      } else if (name === 'Piece' && parent === file.kind && stack.length === 2) {
        if (file.pieces.push(readPiece(file.kind, attributes, events.failAt(line))) > mostPieces) events.failAt(line)(`more than ${mostPieces} pieces`, 'fewer pieces');
      } else if (parent === 'Piece' || (parent === file.kind && name === 'FieldData')) {
        section = sections.find((each) => each === name) ?? null;
        axes = 0;
      } else if (name === 'DataArray' && parent === section) openArray(attributes, line);
      stack.push(name);
    },
    close(name) {
      stack.pop();
      if (name === 'DataArray' && stack.at(-1) === section) events.arrayEnd();
      else if (name === section) section = null;
      else if (name === 'Piece') events.pieceEnd();
    },
  };
}

const isData = (section: Section): boolean => section === 'PointData' || section === 'CellData' || section === 'FieldData';

/** Arrays of coordinates go by their place, whatever they are called. */
function nameOf(section: Section, attributes: Attributes, place: number): string {
  if (section === 'Coordinates') return axisNames[place] ?? `number ${place + 1}`;
  if (section === 'Points') return 'Points';
  return attributes.Name ?? '';
}

function componentsOf(section: Section, attributes: Attributes, fail: Fail): number {
  const components = readCount(attributes, 'NumberOfComponents', fail, section === 'Points' ? 3 : 1);
  if (section === 'Points' && components !== 3) fail(`${components} coordinates for each point`, '3');
  refuseManyColumns(components);
  return isData(section) || section === 'Points' ? Math.max(1, components) : 1;
}

function encodingOf({ format = 'ascii' }: Attributes, refuse: Fail): ArrayTag['encoding'] {
  if (format === 'ascii' || format === 'appended') return format;
  if (format === 'binary') return 'inline base64';
  return refuse(`VTK XML with numbers as ${format}`, 'them as ascii, binary or appended');
}

