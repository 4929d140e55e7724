import { z } from 'zod';

export const tokenScopeSchema = z.enum(['read', 'write']);
export type TokenScope = z.infer<typeof tokenScopeSchema>;
