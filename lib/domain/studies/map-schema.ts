import { z } from 'zod';
import { mapPlanes } from '@/lib/numerics/maps/error-map';
import { contract } from '../api/contract';

const sideSchema = z.tuple([z.number(), z.number()]);

/** What a map is of. Studies list them with a grid's result. */
export const gridMapSchema = z.strictObject({
  field: z.string(),
  plane: z.enum(mapPlanes).meta({ description: 'The directions along its width and height; over the third, each bin has the largest error of all.' }),
  width: z.number().int(), height: z.number().int().meta({ description: '1 where the problem has one dimension.' }),
  bounds: z.strictObject({ x: sideSchema.optional(), y: sideSchema.optional(), z: sideSchema.optional() })
    .meta({ description: 'The box of the problem, where it has one, else around the rows of the file.' }),
  largest: z.number().meta({ description: 'The largest error on it.' }),
});

const gridMapBinsSchema = gridMapSchema.extend({
  label: z.string(),
  rows: z.array(z.array(z.number().nullable()))
    .meta({ description: 'The largest |e| of each bin to four digits, row by row from the lowest second coordinate; null where no row of the file lies.' }),
});
export type GridMapBins = z.infer<typeof gridMapBinsSchema>;

export const getGridMapContract = contract({
  method: 'GET', path: '/studies/{id}/grids/{label}/maps/{field}', summary: 'A map of the errors of one field on one grid', access: 'organisation', status: 200,
  query: z.strictObject({
    plane: z.enum(mapPlanes).optional().meta({ description: 'xy where it is left out, x in one dimension.' }),
    revision: z.coerce.number().int().min(1).max(999_999_999).optional(),
  }),
  response: gridMapBinsSchema,
});
