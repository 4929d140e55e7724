import type { Context } from '../context';

const channelOf = (organisationId: string, userId: string) => `member.${organisationId}.${userId}`;

/** Tells the open event streams of a member that what they may see has changed. Calls are decided anew anyway. */
export async function announceMembership(ctx: Pick<Context, 'events' | 'log'>, organisationId: string, userId: string): Promise<void> {
  try {
    await ctx.events.publish(channelOf(organisationId, userId), 'changed');
  } catch (error) {
    ctx.log.warn({ userId, fault: error instanceof Error ? error.message : 'unknown' }, 'change of a member not told');
  }
}

/** Calls back once the member may see something else than when they began. */
export function watchMembership(ctx: Pick<Context, 'events'>, organisationId: string, userId: string, onChange: () => void): Promise<() => void> {
  return ctx.events.subscribe(channelOf(organisationId, userId), onChange);
}
