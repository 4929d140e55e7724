import { getServer } from '@/app/_server/context';
import { route } from '@/app/_server/route';
import { printOpenApi } from '@/lib/domain/api/openapi';
import { openApiContract } from '@/lib/domain/api/service-schema';

// Printed once: it takes long, anybody may ask for it, and it is the same as long as the process lives.
let printed: string | undefined;

export const GET = route(openApiContract, ({ headers }) => {
  printed ??= JSON.stringify(printOpenApi(getServer().env.PUBLIC_URL));
  headers.set('content-type', 'application/json');
  return Promise.resolve(new Response(printed, { headers }));
});
