import { z } from 'zod';
import { contract } from '../api/contract';
import { nameSchema, timestampSchema } from '../api/names';

export const organisationSchema = z.strictObject({
  id: z.string(), slug: z.string(), name: z.string(), revision: z.number().int(), createdAt: timestampSchema,
});
export type Organisation = z.infer<typeof organisationSchema>;

export const updateOrganisationSchema = z.strictObject({ name: nameSchema });
export type UpdateOrganisationInput = z.infer<typeof updateOrganisationSchema>;

export const getOrganisationContract = contract({
  method: 'GET', path: '/organisation', summary: 'The organisation', access: 'organisation', status: 200, response: organisationSchema,
});
export const updateOrganisationContract = contract({
  method: 'PATCH', path: '/organisation', summary: 'Rename the organisation', access: 'organisation', status: 200,
  body: updateOrganisationSchema, response: organisationSchema, conditional: true,
});
