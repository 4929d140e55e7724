import { eventStream } from '@/app/_server/event-stream';
import { holdPlace } from '@/app/_server/held-places';
import { route } from '@/app/_server/route';
import { studyEventSchema } from '@/lib/domain/events/schema';
import { getEventsContract } from '@/lib/domain/studies/schema';
import { watchStudy } from '@/lib/services/studies/watch-study';

export const GET = route(getEventsContract, ({ ctx, params, request, headers }) => eventStream(request.signal, headers, async (send, end) => {
  const leave = holdPlace('events', ctx);
  const waiting: string[] = [];
  const relay = (message: string) => send(studyEventSchema.parse(JSON.parse(message)).event, message);
  let isStarted = false;
  const { snapshot, stop } = await watchStudy(ctx, params.id, (message) => {
    if (isStarted) relay(message);
    else waiting.push(message);
  }, end).catch((error: unknown) => {
    leave();
    throw error;
  });
  send('snapshot', JSON.stringify(snapshot));
  waiting.forEach(relay);
  isStarted = true;
  return () => {
    stop();
    leave();
  };
}));
