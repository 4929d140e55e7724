import { outcomeResponse, wantsXml } from '@/app/_server/outcome-response';
import { drainSignal } from '@/app/_server/request-record';
import { route } from '@/app/_server/route';
import { getOutcomeContract } from '@/lib/domain/studies/schema';
import { getOutcome } from '@/lib/services/studies/get-outcome';

export const GET = route(getOutcomeContract, async ({ ctx, params, query, request, headers }) => {
  const reading = await getOutcome(ctx, params.id, query.wait, AbortSignal.any([request.signal, drainSignal()]));
  return outcomeResponse(reading, headers, { xml: wantsXml(request.headers), inconclusive: query.inconclusive });
});
