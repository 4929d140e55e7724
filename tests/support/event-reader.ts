import type { ContractShape } from '@/lib/domain/api/contract';
import { getEventsContract } from '@/lib/domain/studies/schema';
import { addressOf, headersOf, type Who } from './api';
import { need } from './environment';

export interface HeardEvent { event: string; data: Record<string, unknown> }

/** Listens to a study as a page does; `until` resolves with everything heard once one event is as wanted. */
export async function listen(who: Who, id: string): Promise<{ until: (isWanted: (event: HeardEvent) => boolean) => Promise<HeardEvent[]>; ended: (seconds: number) => Promise<void>; stop: () => void; type: string | null }> {
  const abort = new AbortController();
  const contract: ContractShape = getEventsContract;
  const response = await fetch(new URL(addressOf(contract, { params: { id } }, who), need('WEB_URL')), { headers: headersOf(contract, who), signal: abort.signal });
  if (!response.body || response.status !== 200) throw new Error(`Events answered ${response.status}.`);
  const reader = response.body.pipeThrough(new TextDecoderStream()).getReader();
  const heard: HeardEvent[] = [];
  let text = '';
  return {
    type: response.headers.get('content-type'),
    stop: () => abort.abort(),
    async ended(seconds) {
      const late = setTimeout(() => abort.abort(new Error(`The events went on after ${seconds} s.`)), seconds * 1000);
      while (!(await reader.read()).done);
      clearTimeout(late);
    },
    async until(isWanted) {
      while (!heard.some(isWanted)) {
        const { value, done } = await reader.read();
        if (done) throw new Error(`The events ended after ${heard.map(({ event }) => event).join(', ')}.`);
        text += value;
        const blocks = text.split('\n\n');
        text = blocks.pop() ?? '';
        for (const block of blocks) {
          const [, event, data] = /^event: (\w+)\ndata: (.*)$/.exec(block) ?? [];
          if (event && data) heard.push({ event, data: JSON.parse(data) as Record<string, unknown> });
        }
      }
      return heard;
    },
  };
}
