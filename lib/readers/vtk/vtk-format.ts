import type { ColumnFormat } from '../column-format';
import { previewVtk } from './preview-vtk';
import { readVtk } from './read-vtk';

export const vtkFormat: ColumnFormat = { preview: previewVtk, read: readVtk };
