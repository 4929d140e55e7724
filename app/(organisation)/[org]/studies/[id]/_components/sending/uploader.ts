import { v4 } from 'uuid';
import type { Grid } from '@/lib/domain/studies/schema';
import { abandonUpload } from './abandon-upload';
import { createBrowserLine } from './browser-line';
import { openElsewhere } from './elsewhere';
import { hashFile, type Hashing } from './hash-file';
import { sendFile } from './send-file';
import { SendFault } from './send-fault';
import { toTransfer, type Sending, type Transfer } from './transfer';
import { forgetUpload } from './upload-memory';

/** Files on their way at once; others wait their turn. */
const mostFiles = 2;

export interface FileToSend {
  grid: string; file: File; fingerprint: string;
  /** The half sent upload to go on with, else the open one to replace. */
  resumes: { id: string; createdAt: string } | null; replaces: string | null;
  keeps: string | null;
}

export interface Uploader {
  subscribe: (listener: () => void) => () => void;
  transfers: () => ReadonlyMap<string, Transfer>;
  send: (file: FileToSend) => void;
  pauseOrResume: (grid: string) => void;
  retry: (grid: string) => void;
  giveUp: (grid: string) => void;
  /** Stops what another upload has taken the place of. */
  heed: (grids: readonly Grid[]) => void;
}

const isOn = ({ state }: Sending) => state === 'sending' || state === 'waiting' || state === 'checking';

class StudyUploader implements Uploader {
  readonly #line;
  readonly #elsewhere;
  readonly #sendings = new Map<string, Sending>();
  readonly #hashings = new Map<Sending, Hashing>();
  readonly #listeners = new Set<() => void>();
  #transfers: ReadonlyMap<string, Transfer> = new Map();
  #told = false;

  constructor(private readonly organisation: string, private readonly study: string) {
    this.#line = createBrowserLine(organisation);
    this.#elsewhere = openElsewhere(study, () => this.#tell());
    window.addEventListener('beforeunload', (event) => { if ([...this.#sendings.values()].some(isOn)) event.preventDefault(); });
    window.addEventListener('online', () => this.#resumeBroken());
  }

  subscribe = (listener: () => void) => {
    this.#listeners.add(listener);
    return () => this.#listeners.delete(listener);
  };

  transfers = () => this.#transfers;

  send = ({ grid, file, fingerprint, resumes, replaces, keeps }: FileToSend) => {
    this.#drop(grid);
    this.#sendings.set(grid, {
      grid, file, fingerprint, keeps, replaces, upload: resumes?.id ?? null, startedAt: resumes?.createdAt ?? null, startKey: v4(),
      stored: new Map(), inFlight: new Map(), samples: [], state: 'queued', fault: null, mayRetry: true, isDropped: false, abort: new AbortController(),
    });
    this.#sendNext();
  };

  pauseOrResume = (grid: string) => {
    const sending = this.#sendings.get(grid);
    if (!sending) return;
    if (sending.state === 'paused') this.retry(grid);
    else {
      this.#stop(sending, 'paused', null);
      this.#sendNext();
    }
  };

  retry = (grid: string) => {
    const sending = this.#sendings.get(grid);
    if (!sending) return;
    if (sending.upload === null) sending.startedAt = null;
    Object.assign(sending, { state: 'queued', fault: null, abort: new AbortController(), samples: [] });
    this.#sendNext();
  };

  giveUp = (grid: string) => {
    const upload = this.#sendings.get(grid)?.upload;
    this.#drop(grid);
    if (upload) abandonUpload(this.organisation, upload);
    this.#sendNext();
  };

  heed = (grids: readonly Grid[]) => {
    for (const { label, upload } of grids) {
      const sending = this.#sendings.get(label);
      if (!sending?.startedAt || !upload || upload.id === sending.upload || upload.createdAt <= sending.startedAt) continue;
      const words = `${upload.createdBy} replaced this file: grid ${label} now has ${upload.filename}.`;
      // Where storage was quicker to say that the upload is gone, this says why.
      if (sending.fault !== words) this.#end(sending, new SendFault('gone', words));
    }
  };

  #sendNext(): void {
    const all = [...this.#sendings.values()];
    const places = mostFiles - all.filter(isOn).length;
    for (const sending of all.filter(({ state }) => state === 'queued').slice(0, Math.max(0, places))) void this.#run(sending);
    this.#tell();
  }

  async #run(sending: Sending): Promise<void> {
    const { abort } = sending;
    try {
      sending.state = 'sending';
      const hashing = this.#hashings.get(sending) ?? hashFile(sending.file);
      this.#hashings.set(sending, hashing);
      await sendFile({ organisation: this.organisation, study: this.study, line: this.#line, onChange: () => this.#tell() }, sending, hashing);
      this.#drop(sending.grid);
    } catch (error) {
      // Paused, given up or replaced: whoever did that has said so already.
      if (abort.signal.aborted) return;
      this.#end(sending, error);
    }
    this.#sendNext();
  }

  #end(sending: Sending, error: unknown): void {
    this.#stop(sending, 'failed', error instanceof Error ? error.message : 'Sending broke off.');
    const kind = error instanceof SendFault ? error.kind : null;
    sending.mayRetry = kind !== 'changed';
    if (kind === 'changed' && sending.upload) abandonUpload(this.organisation, sending.upload);
    if (kind === 'changed' || kind === 'gone') {
      if (sending.upload) forgetUpload(sending.upload);
      Object.assign(sending, { upload: null, stored: new Map(), startKey: v4(), replaces: null });
      this.#dropHashing(sending);
    }
    this.#tell();
  }

  #stop(sending: Sending, state: 'paused' | 'failed', fault: string | null): void {
    sending.state = state;
    sending.fault = fault;
    sending.inFlight = new Map();
    sending.abort.abort();
    this.#tell();
  }

  #drop(grid: string): void {
    const sending = this.#sendings.get(grid);
    if (!sending) return;
    this.#sendings.delete(grid);
    sending.isDropped = true;
    sending.abort.abort();
    this.#dropHashing(sending);
    this.#tell();
  }

  #dropHashing(sending: Sending): void {
    this.#hashings.get(sending)?.stop();
    this.#hashings.delete(sending);
  }

  #resumeBroken(): void {
    for (const { grid, state, mayRetry } of this.#sendings.values()) if (state === 'failed' && mayRetry) this.retry(grid);
  }

  /** Once a frame at most: parts report many times a second. */
  #tell(): void {
    if (this.#told) return;
    this.#told = true;
    setTimeout(() => {
      this.#told = false;
      const own = [...this.#sendings.values()].map(toTransfer);
      this.#elsewhere.tell(own);
      this.#transfers = new Map([...this.#elsewhere.transfers(), ...own.map((each) => [each.grid, each] as const)]);
      for (const listener of this.#listeners) listener();
    }, 50);
  }
}

const uploaders = new Map<string, Uploader>();

/** The one uploader of a study in this window: it goes on sending while other pages are looked at. */
export function uploaderOf(organisation: string, study: string): Uploader {
  const key = `${organisation} ${study}`;
  const present = uploaders.get(key);
  if (present) return present;
  const made = new StudyUploader(organisation, study);
  uploaders.set(key, made);
  return made;
}
