import { route } from '@/app/_server/route';
import { createReleaseContract, listReleasesContract } from '@/lib/domain/codes/schema';
import { createRelease } from '@/lib/services/releases/create-release';
import { listReleases } from '@/lib/services/releases/list-releases';

export const POST = route(createReleaseContract, ({ ctx, params, body }) => createRelease(ctx, params.code, body));
export const GET = route(listReleasesContract, ({ ctx, params, query }) => listReleases(ctx, params.code, query));
