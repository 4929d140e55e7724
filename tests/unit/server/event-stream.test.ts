import { describe, expect, it } from 'vitest';
import { eventStream } from '@/app/_server/event-stream';

async function open() {
  let stops = 0;
  let send: (event: string, data: string) => void = () => undefined;
  const response = await eventStream(new AbortController().signal, new Headers(), (given) => {
    send = given;
    return Promise.resolve(() => { stops += 1; });
  });
  if (!response.body) throw new Error('There is no stream.');
  return { reader: response.body.getReader(), send: (data: string) => send('state', data), stops: () => stops };
}
const kilobyte = 'a'.repeat(1000);

describe('eventStream(signal, headers, begin)', () => {
  it('drops a reader who takes nothing once 256 KiB wait, and holds no more', async () => {
    const { reader, send, stops } = await open();
    for (let count = 0; count < 10_000 && stops() === 0; count += 1) send(kilobyte);
    expect(stops()).toBe(1);
    await expect(reader.read()).rejects.toThrow('does not take them');
    send(kilobyte);
    expect(stops()).toBe(1);
  });

  it('goes on with one who does, however much is sent', async () => {
    const { reader, send, stops } = await open();
    let bytes = 0;
    for (let count = 0; count < 2000; count += 1) {
      send(kilobyte);
      bytes += (await reader.read()).value?.length ?? 0;
    }
    expect(bytes).toBeGreaterThan(2_000_000);
    expect(stops()).toBe(0);
    await reader.cancel();
    expect(stops()).toBe(1);
  });
});
