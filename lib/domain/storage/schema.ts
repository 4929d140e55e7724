import { z } from 'zod';
import { contract } from '../api/contract';
import { timestampSchema } from '../api/names';

export const storageSchema = z.strictObject({
  quota: z.number().meta({ description: 'Bytes the organisation may store.' }),
  used: z.number().meta({ description: 'Bytes of whole files and those announced by open uploads. Files given up do not count; a replaced file counts until it is removed, a day after.' }),
  announced: z.number().meta({ description: 'What of it open uploads have announced.' }),
  studies: z.array(z.strictObject({
    id: z.string(), code: z.string(), release: z.string(), case: z.string(), bytes: z.number(), files: z.number().int(),
  })).meta({ description: 'Largest first, at most 100.' }),
  uploads: z.array(z.strictObject({
    id: z.string(), study: z.string(), grid: z.string(), filename: z.string(), bytes: z.number(), createdBy: z.string(),
    createdAt: timestampSchema, lastActivityAt: timestampSchema,
  })).meta({ description: 'Open uploads, oldest first.' }),
});
export type StorageUse = z.infer<typeof storageSchema>;

export const getStorageContract = contract({
  method: 'GET', path: '/storage', summary: 'Bytes stored, by study, and open uploads', access: 'organisation', status: 200, response: storageSchema,
});
