import { partCountOf } from '@/lib/domain/uploads/part-size';
import { callAgain, waitForNextTry, type Line, type PartAddress } from './line';
import { judgePart, mostTries } from './retry-plan';
import { changedFile, SendFault } from './send-fault';

/** Parts on their way at once: few, since each counts only once it is whole and a slow line should show something soon. */
const lanes = 3;
/** Addresses asked for at once. They end after a while, so not all of them before. */
const signedAtOnce = 10;
const renewedAtOnce = 2;

export interface PartsJob {
  upload: string;
  file: Blob & { name: string };
  partSize: number;
  /** Parts that storage has, by number, with their ETags; those sent are added. */
  stored: Map<number, string>;
  signal: AbortSignal;
  onStored: (number: number) => void;
  onSent: (number: number, bytes: number) => void;
  /** Whether anything is on its way, or all wait to try again. */
  onWaiting: (isWaiting: boolean) => void;
}

/** Sends the parts that storage lacks, each until it is stored. One that fails for good ends the others. */
export async function sendParts(line: Line, job: PartsJob): Promise<void> {
  const count = partCountOf(job.file.size, job.partSize);
  const missing = Array.from({ length: count }, (_, index) => index + 1).filter((number) => !job.stored.has(number));
  const waitingForLane = [...missing];
  const stop = new AbortController();
  const signal = AbortSignal.any([job.signal, stop.signal]);
  const addresses = new Map<number, PartAddress>();
  let asking: Promise<void> = Promise.resolve();
  const waiting = new Set<number>();

  const isPastItsTime = ({ expiresAt }: PartAddress) => Date.parse(expiresAt) <= line.now();
  const tellWaiting = (number: number, isWaiting: boolean) => {
    if (isWaiting) waiting.add(number);
    else waiting.delete(number);
    job.onWaiting(waiting.size > 0 && waiting.size >= Math.min(lanes, count - job.stored.size));
  };
  /** Lanes ask one after the other, so that one answer serves those that follow. */
  const addressOf = async (number: number): Promise<PartAddress> => {
    const ask = asking.then(async () => {
      const known = addresses.get(number);
      if (known && !isPastItsTime(known)) return;
      const next = missing.filter((other) => other !== number && !job.stored.has(other) && !addresses.has(other)).slice(0, signedAtOnce - 1);
      for (const address of await callAgain(line, signal, () => line.sign(job.upload, [number, ...next]))) addresses.set(address.number, address);
    });
    asking = ask.catch(() => undefined);
    await ask;
    const address = addresses.get(number);
    if (!address) throw new SendFault('refused', `The server gave no address for part ${number}.`);
    return address;
  };

  const sendPart = async (number: number) => {
    const part = job.file.slice((number - 1) * job.partSize, number * job.partSize);
    for (let [failures, renewals] = [0, 0]; ;) {
      const address = await addressOf(number);
      const { status, etag } = await line.put(address.url, part, { signal, onSent: (bytes) => job.onSent(number, bytes) });
      const verdict = judgePart({ status, isPastItsTime: isPastItsTime(address) });
      if (verdict === 'stored' && etag !== null) {
        tellWaiting(number, false);
        job.stored.set(number, etag);
        job.onStored(number);
        return;
      }
      job.onSent(number, 0);
      addresses.delete(number);
      if (verdict === 'gone') throw new SendFault('gone', 'Storage no longer has this upload. Retry sends the file anew.');
      if (status === 0) await assertUnchanged(job.file, part);
      // An address past its time is no failure; one that is refused when it is new is.
      if (verdict === 'expired' && renewals < renewedAtOnce) {
        renewals += 1;
        continue;
      }
      renewals = 0;
      if (line.isOnline()) failures += 1;
      if (failures >= mostTries) throw new SendFault('line', 'Storage could not be reached. What is stored stays; retry goes on from there.');
      tellWaiting(number, true);
      await waitForNextTry(line, Math.max(1, failures), signal);
    }
  };

  const lane = async () => {
    for (let number = waitingForLane.shift(); number !== undefined; number = waitingForLane.shift()) await sendPart(number);
  };
  const running = Array.from({ length: lanes }, lane);
  try {
    await Promise.all(running);
  } catch (error) {
    stop.abort();
    await Promise.allSettled(running);
    throw error;
  }
}

/** A browser refuses to read a file that is no longer as it was when it was chosen. */
async function assertUnchanged(file: Blob & { name: string }, part: Blob): Promise<void> {
  try {
    await part.slice(0, 1).arrayBuffer();
  } catch {
    throw changedFile(file.name);
  }
}
