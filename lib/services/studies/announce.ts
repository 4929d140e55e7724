import type { StudyEvent } from '@/lib/domain/events/schema';
import type { Context } from '../context';

/** Tells the pages that watch a study. Pages read the study again by themselves, so work never fails for want of listeners. */
export async function announce(ctx: Pick<Context, 'events' | 'log'>, studyId: string, event: StudyEvent): Promise<void> {
  try {
    await ctx.events.publish(studyId, JSON.stringify(event));
  } catch (error) {
    ctx.log.warn({ studyId, fault: error instanceof Error ? error.message : 'unknown' }, 'event not told');
  }
}
