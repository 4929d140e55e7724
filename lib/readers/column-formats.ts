import type { ColumnFormat } from './column-format';
import { hdf5Format } from './hdf5/hdf5-format';
import { jsonFormat } from './json/json-format';
import type { SourceFormat } from './source';
import { vtkFormat } from './vtk/vtk-format';

export const columnFormats: Readonly<Record<Exclude<SourceFormat, 'table'>, ColumnFormat>> = { json: jsonFormat, hdf5: hdf5Format, vtk: vtkFormat };
