import { getServer } from '@/app/_server/context';
import { mayReadMetrics } from '@/app/_server/metrics-access';
import { route } from '@/app/_server/route';
import { metricsContract } from '@/lib/domain/api/service-schema';
import { AppError } from '@/lib/errors';
import { measureService } from '@/lib/services/service/measure-service';

export const GET = route(metricsContract, async ({ ctx, request, headers }) => {
  const { env, metrics, countQueue } = getServer();
  if (!mayReadMetrics(request.headers, env.METRICS_TOKEN)) throw new AppError('not-found', 'There are no metrics for this caller.');
  metrics.setMeasures(await measureService(ctx, countQueue));
  headers.set('content-type', metrics.registry.contentType);
  return new Response(await metrics.registry.metrics(), { status: 200, headers });
});
