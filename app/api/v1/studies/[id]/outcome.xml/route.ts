import { awaitOutcome } from '@/app/_server/await-outcome';
import { outcomeResponse } from '@/app/_server/outcome-response';
import { route } from '@/app/_server/route';
import { getOutcomeXmlContract } from '@/lib/domain/studies/schema';

export const GET = route(getOutcomeXmlContract, async ({ ctx, params, query, request, headers }) => {
  const reading = await awaitOutcome(ctx, params.id, { wait: query.wait, request });
  return outcomeResponse(reading, headers, { xml: true, inconclusive: query.inconclusive });
});
