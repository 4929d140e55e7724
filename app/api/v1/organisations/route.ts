import { route } from '@/app/_server/route';
import { createOrganisationContract } from '@/lib/domain/people/schema';
import { addOrganisation } from '@/lib/services/people/add-organisation';

export const POST = route(createOrganisationContract, ({ ctx, body }) => addOrganisation(ctx, body));
