import { route } from '@/app/_server/route';
import { getOrganisationContract, updateOrganisationContract } from '@/lib/domain/organisation/schema';
import { getOrganisation } from '@/lib/services/organisation/get-organisation';
import { updateOrganisation } from '@/lib/services/organisation/update-organisation';

export const GET = route(getOrganisationContract, ({ ctx }) => getOrganisation(ctx));
export const PATCH = route(updateOrganisationContract, ({ ctx, ifMatch, body }) => updateOrganisation(ctx, ifMatch, body));
