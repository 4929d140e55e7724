import type { Redis } from 'ioredis';
import { RateLimiterRedis, RateLimiterRes } from 'rate-limiter-flexible';
import { AppError } from '@/lib/errors';

const limits = {
  'sign-in-account': { points: 10, duration: 300 },
  'sign-in-address': { points: 100, duration: 300 },
  'sign-up': { points: 120, duration: 60 },
  'reset-address': { points: 60, duration: 900 },
  'reset-account': { points: 5, duration: 900 },
  // Guessing the secret of a link is hopeless; this keeps it cheap for the server too.
  link: { points: 120, duration: 60 },
  invitation: { points: 100, duration: 3600 },
  calculator: { points: 600, duration: 60 },
} as const;

export type RateLimit = keyof typeof limits;

export interface RateLimits {
  /** Takes one point of the key, or refuses with 429 and when to come back. */
  take(limit: RateLimit, key: string): Promise<void>;
  /** Gives the key its points back, as after a sign-in that succeeded. */
  clear(limit: RateLimit, key: string): Promise<void>;
}

export function createRateLimits(redis: Redis): RateLimits {
  const limiters = new Map(
    Object.entries(limits).map(([name, limit]) => [name, new RateLimiterRedis({ storeClient: redis, keyPrefix: `rate.${name}`, ...limit })]),
  );
  const limiterOf = (limit: RateLimit) => {
    const limiter = limiters.get(limit);
    if (!limiter) throw new Error(`No rate limit is named ${limit}.`);
    return limiter;
  };

  return {
    async take(limit, key) {
      try {
        await limiterOf(limit).consume(key);
      } catch (refusal) {
        if (!(refusal instanceof RateLimiterRes)) throw refusal;
        const seconds = Math.max(1, Math.ceil(refusal.msBeforeNext / 1000));
        throw new AppError('too-many-requests', `Too many requests. Try again in ${seconds} s.`, { retryAfter: seconds });
      }
    },
    async clear(limit, key) {
      await limiterOf(limit).delete(key);
    },
  };
}
