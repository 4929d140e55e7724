import { getServer } from '@/app/_server/context';
import { route } from '@/app/_server/route';
import { printOpenApi } from '@/lib/domain/api/openapi';
import { openApiContract } from '@/lib/domain/api/service-schema';

export const GET = route(openApiContract, () => Promise.resolve(Response.json(printOpenApi(getServer().env.PUBLIC_URL))));
