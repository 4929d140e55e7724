import { z } from 'zod';

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
  fields: z.record(z.string().min(1), column),
});

export type ColumnMapping = z.infer<typeof columnMappingSchema>;
