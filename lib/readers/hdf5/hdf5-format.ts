import type { ColumnFormat } from '../column-format';
import { previewHdf5 } from './preview-hdf5';
import { readHdf5 } from './read-hdf5';

export const hdf5Format: ColumnFormat = { preview: previewHdf5, read: readHdf5 };
