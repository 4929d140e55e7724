import { callApi } from '@/app/_components/api/call-api';
import { signPartsContract } from '@/lib/domain/uploads/schema';
import type { Line, PartAnswer } from './line';

/** A part of which nothing moves for so long is sent anew: a line that went away says nothing. */
const stallMilliseconds = 60_000;

/** Unlike fetch it tells how far a body is. */
function put(url: string, part: Blob, { signal, onSent }: { signal: AbortSignal; onSent: (bytes: number) => void }): Promise<PartAnswer> {
  return new Promise((resolve, reject) => {
    const request = new XMLHttpRequest();
    let stall: ReturnType<typeof setTimeout>;
    const leave = () => {
      clearTimeout(stall);
      signal.removeEventListener('abort', abort);
      window.removeEventListener('offline', breakOff);
    };
    const end = (answer: PartAnswer) => {
      leave();
      resolve(answer);
    };
    const abort = () => {
      leave();
      request.abort();
      reject(signal.reason as Error);
    };
    const breakOff = () => {
      request.abort();
      end({ status: 0, etag: null });
    };
    const watch = () => {
      clearTimeout(stall);
      stall = setTimeout(breakOff, stallMilliseconds);
    };
    if (signal.aborted) { reject(signal.reason as Error); return; }
    signal.addEventListener('abort', abort);
    window.addEventListener('offline', breakOff);
    watch();
    request.upload.onprogress = ({ loaded }) => {
      watch();
      onSent(loaded);
    };
    request.onload = () => end({ status: request.status, etag: request.status < 300 ? request.getResponseHeader('etag') : null });
    request.onerror = () => end({ status: 0, etag: null });
    request.open('PUT', url);
    request.send(part);
  });
}

function wait(milliseconds: number, signal: AbortSignal): Promise<void> {
  return new Promise((resolve, reject) => {
    const end = () => {
      clearTimeout(timer);
      window.removeEventListener('online', end);
      signal.removeEventListener('abort', end);
      if (signal.aborted) reject(signal.reason as Error);
      else resolve();
    };
    const timer = setTimeout(end, milliseconds);
    window.addEventListener('online', end);
    signal.addEventListener('abort', end);
  });
}

/** The line from this window: the API as who is signed in, storage by signed addresses. */
export function createBrowserLine(organisation: string): Line {
  return {
    sign: async (upload, numbers) => (await callApi(signPartsContract, { organisation, params: { id: upload }, body: { numbers } })).parts,
    put,
    isOnline: () => navigator.onLine,
    wait,
    now: () => Date.now(),
    random: Math.random,
  };
}
