import { partSizeOf } from '@/lib/domain/uploads/part-size';
import { transferRate, type Sample } from './transfer-rate';

export type TransferState = 'queued' | 'sending' | 'waiting' | 'paused' | 'checking' | 'failed';

/** A file on its way to storage. `confirmed` counts whole parts that storage has answered for. */
export interface Transfer {
  grid: string; filename: string; bytes: number; fingerprint: string;
  confirmed: number; rate: number | null; secondsLeft: number | null;
  state: TransferState;
  fault: string | null;
  mayRetry: boolean;
  /** The file that the grid keeps until this one is whole. */
  keeps: string | null;
  /** Sent by another tab of this browser: to be watched only. */
  isElsewhere: boolean;
}

/** A transfer as its own window keeps it. */
export interface Sending {
  grid: string; file: File; fingerprint: string; keeps: string | null; replaces: string | null;
  upload: string | null;
  startedAt: string | null;
  /** Under which a start that got no answer is asked for again. */
  startKey: string;
  stored: Map<number, string>;
  inFlight: Map<number, number>;
  samples: Sample[];
  state: TransferState;
  fault: string | null;
  mayRetry: boolean;
  /** Given up, replaced by another file, or done. */
  isDropped: boolean;
  abort: AbortController;
}

/** Bytes of the parts that are stored; only the last part may be short. */
export function confirmedBytes(bytes: number, numbers: Iterable<number>): number {
  const partSize = partSizeOf(bytes);
  let sum = 0;
  for (const number of numbers) sum += Math.min(partSize, bytes - (number - 1) * partSize);
  return sum;
}

/** Confirmed bytes and those on their way, of which the rate is taken. */
export function sentBytes({ file, stored, inFlight }: Pick<Sending, 'file' | 'stored' | 'inFlight'>): number {
  let sum = confirmedBytes(file.size, stored.keys());
  for (const [number, bytes] of inFlight) if (!stored.has(number)) sum += bytes;
  return Math.min(sum, file.size);
}

export function toTransfer(sending: Sending): Transfer {
  const { grid, file, fingerprint, keeps, state, fault, mayRetry } = sending;
  const rate = state === 'sending' ? transferRate(sending.samples) : null;
  return {
    grid, filename: file.name, bytes: file.size, fingerprint, confirmed: confirmedBytes(file.size, sending.stored.keys()),
    rate, secondsLeft: rate === null ? null : (file.size - sentBytes(sending)) / rate, state, fault, mayRetry, keeps, isElsewhere: false,
  };
}
