import { route } from '@/app/_server/route';
import { updateReleaseContract } from '@/lib/domain/codes/schema';
import { updateRelease } from '@/lib/services/releases/update-release';

export const PATCH = route(updateReleaseContract, ({ ctx, params, ifMatch, body }) => updateRelease(ctx, params, ifMatch, body));
