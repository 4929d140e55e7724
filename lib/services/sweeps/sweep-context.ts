import type { Context } from '../context';

/** What sweeps work with: nobody acts. */
export type SweepContext = Pick<Context, 'db' | 'storage' | 'events' | 'clock' | 'log'>;

const dayMilliseconds = 24 * 3600 * 1000;

/** A moment so many days before now. */
export const daysAgo = (ctx: Pick<SweepContext, 'clock'>, days: number): Date => new Date(ctx.clock().getTime() - days * dayMilliseconds);
