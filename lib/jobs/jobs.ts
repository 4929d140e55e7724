import { z } from 'zod';

/** Jobs carry ids only; what they work on is read from the database when they run. */
export const jobPayloadSchema = z.strictObject({
  outboxId: z.string(), organisationId: z.string().nullable(), subjectId: z.string(), subjectRevision: z.number().int().nullable(), attempt: z.number().int(),
  /** For the log: absent in jobs queued by a version before. */
  requestId: z.string().nullable().default(null),
});
export type JobPayload = z.infer<typeof jobPayloadSchema>;

/** `grid.read`: subject is a grid. `study.assess`: a study in a revision. `study.recheck`: a re-check. `mail.send`: a mail, of an organisation or of none. */
export const jobNameSchema = z.enum(['grid.read', 'study.assess', 'study.recheck', 'mail.send']);
export type JobName = z.infer<typeof jobNameSchema>;

export const queueName = 'fourfold';
