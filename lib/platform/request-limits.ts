import type { Redis } from 'ioredis';
import { RateLimiterMemory, RateLimiterRedis, RateLimiterRes } from 'rate-limiter-flexible';
import { AppError } from '@/lib/errors';
import type { Logger } from './logger';

/** How long Redis is left alone once it did not answer, so that calls which need none are as quick as before. */
const spareMilliseconds = 5000;

export interface Requester { kind: 'token' | 'person'; id: string }
export interface RequestLimits {
  /** Counts one request of the requester, or refuses with 429 and when to come back. */
  count(requester: Requester): Promise<void>;
}

interface Options { redis: Redis; log: Logger; aMinute: Record<Requester['kind'], number> }

/**
 * Requests a minute, counted in Redis for all web processes together. While Redis does not answer each process counts by
 * itself: reading and looking go on without it.
 */
export function createRequestLimits({ redis, log, aMinute }: Options): RequestLimits {
  const limiterOf = (kind: Requester['kind']) => {
    const options = { keyPrefix: `rate.${kind}`, points: aMinute[kind], duration: 60 };
    return { shared: new RateLimiterRedis({ storeClient: redis, ...options }), own: new RateLimiterMemory(options) };
  };
  const limiters = { token: limiterOf('token'), person: limiterOf('person') };
  let spareUntil = 0;

  const consume = async ({ kind, id }: Requester) => {
    const { shared, own } = limiters[kind];
    if (redis.status !== 'ready' || Date.now() < spareUntil) return own.consume(id);
    try {
      return await shared.consume(id);
    } catch (refusal) {
      if (refusal instanceof RateLimiterRes) throw refusal;
      spareUntil = Date.now() + spareMilliseconds;
      log.warn({ err: refusal }, 'requests are counted by this process alone');
      return own.consume(id);
    }
  };

  return {
    async count(requester) {
      try {
        await consume(requester);
      } catch (refusal) {
        if (!(refusal instanceof RateLimiterRes)) throw refusal;
        const wait = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000));
        const who = requester.kind === 'token' ? 'This token' : 'You';
        const verb = requester.kind === 'token' ? 'has' : 'have';
        throw new AppError('too-many-requests', `${who} ${verb} made more than ${aMinute[requester.kind]} requests in a minute. Go on in ${wait} s; ask less often, such as by ?wait= on the outcome.`, { retryAfter: wait });
      }
    },
  };
}
