import { z } from 'zod';

/** An error as it is answered, RFC 9457. */
export const problemSchema = z.strictObject({
  type: z.string(), title: z.string(), status: z.number().int(), detail: z.string(),
  errors: z.array(z.strictObject({ path: z.string(), message: z.string() })),
});
