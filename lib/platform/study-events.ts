import type { Redis } from 'ioredis';

type Listener = (message: string) => void;

/** Events of studies over Redis publish and subscribe: any process tells, any page hears. */
export interface StudyEvents {
  publish(studyId: string, message: string): Promise<void>;
  /** Resolves once the subscription stands, to the function that ends it. */
  subscribe(studyId: string, listener: Listener): Promise<() => void>;
}

const channelOf = (studyId: string) => `study-events.${studyId}`;

/** One subscribing connection for the whole process, shared by every page that listens. */
export function createStudyEvents(redis: Redis, subscriber: Redis): StudyEvents {
  const listeners = new Map<string, Set<Listener>>();
  subscriber.on('message', (channel: string, message: string) => {
    for (const listener of listeners.get(channel) ?? []) listener(message);
  });

  return {
    async publish(studyId, message) {
      await redis.publish(channelOf(studyId), message);
    },
    async subscribe(studyId, listener) {
      const channel = channelOf(studyId);
      const present = listeners.get(channel);
      if (present) present.add(listener);
      else listeners.set(channel, new Set([listener]));
      await subscriber.subscribe(channel);
      return () => {
        const remaining = listeners.get(channel);
        remaining?.delete(listener);
        if (remaining?.size !== 0) return;
        listeners.delete(channel);
        void subscriber.unsubscribe(channel);
      };
    },
  };
}
