import { z } from 'zod';

/** `sending` that lasts: whether it went out is not known. `cancelled`: what it was about had ended before it was sent. */
export const mailStateSchema = z.enum(['queued', 'sending', 'sent', 'failed', 'cancelled']);
export type MailState = z.infer<typeof mailStateSchema>;
