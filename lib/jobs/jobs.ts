import { z } from 'zod';

/** Jobs carry ids only; what they work on is read from the database when they run. */
export const jobPayloadSchema = z.strictObject({
  outboxId: z.string(), organisationId: z.string(), subjectId: z.string(), subjectRevision: z.number().int().nullable(), attempt: z.number().int(),
  /** For the log: absent in jobs queued by a version before. */
  requestId: z.string().nullable().default(null),
});
export type JobPayload = z.infer<typeof jobPayloadSchema>;

/** `grid.read`: subject is a grid. `study.assess`: subject is a study in a revision. */
export const jobNameSchema = z.enum(['grid.read', 'study.assess']);
export type JobName = z.infer<typeof jobNameSchema>;

export const queueName = 'fourfold';
