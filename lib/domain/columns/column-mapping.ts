import { z } from 'zod';
import { givenDialectSchema } from './given-dialect';

const column = z.string().min(1).max(200);

/** Which column of a file is what. `weight: null` says that every row weighs the same. */
export const columnMappingSchema = z.strictObject({
  x: column,
  y: column.optional(),
  z: column.optional(),
  t: column.optional(),
  weight: column.nullable(),
  dx: column.optional(),
  dy: column.optional(),
  dz: column.optional(),
  distance: column.optional(),
  flag: column.optional(),
  fields: z.record(z.string().min(1), z.union([column, z.array(column).min(1).max(4)]))
    .meta({ description: 'The column of each field; the columns of its gradient, one for each direction; or both, the field’s first.' }),
  table: givenDialectSchema.optional().meta({ description: 'How text tables are written, where it is not to be found out from each file.' }),
});

export type ColumnMapping = z.infer<typeof columnMappingSchema>;

/** A mapping as the reader takes it: one column for everything that has one. */
export type ReaderMapping = Omit<ColumnMapping, 'fields'> & { fields: Record<string, string> };
