import { awaitOutcome } from '@/app/_server/await-outcome';
import { outcomeResponse, wantsXml } from '@/app/_server/outcome-response';
import { route } from '@/app/_server/route';
import { getOutcomeContract } from '@/lib/domain/studies/schema';

export const GET = route(getOutcomeContract, async ({ ctx, params, query, request, headers }) => {
  const reading = await awaitOutcome(ctx, params.id, { wait: query.wait, request });
  return outcomeResponse(reading, headers, { xml: wantsXml(request.headers), inconclusive: query.inconclusive });
});
