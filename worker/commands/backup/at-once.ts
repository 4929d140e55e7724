/** Does something with each of many, a few at a time; the first fault ends it. */
export async function atOnce<T>(items: AsyncIterable<T>, count: number, work: (item: T) => Promise<void>): Promise<void> {
  const running = new Set<Promise<void>>();
  for await (const item of items) {
    const one = work(item).finally(() => running.delete(one));
    running.add(one);
    // Heard below, at the latest when all are awaited.
    one.catch(() => undefined);
    if (running.size >= count) await Promise.race(running);
  }
  await Promise.all(running);
}
