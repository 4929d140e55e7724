import type { ColumnFormat } from '../column-format';
import { previewJson } from './preview-json';
import { readJson } from './read-json';

export const jsonFormat: ColumnFormat = { preview: previewJson, read: readJson };
