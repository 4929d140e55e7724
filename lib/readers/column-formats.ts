import type { ColumnFormat } from './column-format';
import { jsonFormat } from './json/json-format';
import type { SourceFormat } from './source';

export const columnFormats: Readonly<Record<Exclude<SourceFormat, 'table'>, ColumnFormat>> = { json: jsonFormat };
