import 'server-only';
import type { MemberContext } from '@/lib/services/context';
import { getOutcome, type OutcomeReading } from '@/lib/services/studies/get-outcome';
import { holdPlace } from './held-places';
import { drainSignal } from './request-record';

/** The outcome as it stands, or waited for in one of the places the caller has, until they or this process go. */
export async function awaitOutcome(ctx: MemberContext, id: string, { wait, request }: { wait: number; request: Request }): Promise<OutcomeReading> {
  const leave = wait > 0 ? holdPlace('wait', ctx) : () => undefined;
  return getOutcome(ctx, id, wait, AbortSignal.any([request.signal, drainSignal()])).finally(leave);
}
