import { z } from 'zod';
import { gridStateSchema, studyStateSchema } from '../studies/schema';

/** What a study's page is told while files are read and the study is assessed. */
export const studyEventSchema = z.discriminatedUnion('event', [
  z.strictObject({ event: z.literal('progress'), grid: z.string(), rowsRead: z.number().int(), bytesRead: z.number(), bytes: z.number() }),
  z.strictObject({ event: z.literal('state'), state: studyStateSchema, grid: z.string().optional(), gridState: gridStateSchema.optional() }),
]);
export type StudyEvent = z.infer<typeof studyEventSchema>;

export const studySnapshotSchema = z.strictObject({
  state: studyStateSchema, revision: z.number().int(),
  grids: z.array(z.strictObject({ label: z.string(), state: gridStateSchema, rowsRead: z.number().int().nullable() })),
});
export type StudySnapshot = z.infer<typeof studySnapshotSchema>;
