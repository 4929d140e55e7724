import type { Upload } from '@/lib/domain/uploads/schema';

export interface ChosenFile { name: string; bytes: number; fingerprint: string }

interface Situation {
  file: ChosenFile;
  /** The upload of the grid that is open, as the server knows it. */
  open: Upload | null;
  /** Begun in this browser. */
  isOurs: boolean;
  /** The file that another tab of this browser is sending for the grid now. */
  elsewhere: { fingerprint: string | null } | null;
  now: number;
}

export type Decision =
  | { kind: 'start'; replaces: string | null }
  | { kind: 'resume'; upload: Upload }
  | { kind: 'watch' }
  | { kind: 'ask'; why: 'being-sent' | 'other-file'; open: Upload };

/** An upload asked for this lately is taken to be on its way. */
const livelyMilliseconds = 60_000;

export const isLively = (upload: Pick<Upload, 'lastActivityAt'>, now: number): boolean => now - Date.parse(upload.lastActivityAt) < livelyMilliseconds;

/** What to do with a file chosen for a grid: send it, go on with what is half sent, only watch, or ask first. */
export function decideSend({ file, open, isOurs, elsewhere, now }: Situation): Decision {
  if (elsewhere && (open === null || elsewhere.fingerprint === file.fingerprint)) return { kind: 'watch' };
  if (open === null) return { kind: 'start', replaces: null };
  if (elsewhere) return { kind: 'ask', why: 'being-sent', open };
  const isSame = open.fingerprint === file.fingerprint && open.bytes === file.bytes && open.filename === file.name;
  const isOthers = !isOurs && isLively(open, now);
  if (isOthers) return { kind: 'ask', why: 'being-sent', open };
  return isSame ? { kind: 'resume', upload: open } : { kind: 'ask', why: 'other-file', open };
}
