import { ProgressBar } from '@/app/_components/ui/progress-bar';
import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import { formatCount } from '@/lib/domain/numbers/format-count';
import { formatSeconds } from '@/lib/domain/numbers/format-seconds';
import type { Grid } from '@/lib/domain/studies/schema';
import type { Reading } from '../use-study-events';
import { OpenUpload } from './open-upload';
import type { Transfer } from './transfer';
import { WithBar } from './with-bar';

interface UploadProgressProps { grid: Grid; transfer: Transfer | undefined; reading: Reading | undefined }

/** How far a file is: bytes that storage has confirmed while it is sent, rows while it is read. */
export function UploadProgress({ grid, transfer, reading }: UploadProgressProps) {
  if (transfer) return <SendingProgress transfer={transfer} />;
  const { state, upload } = grid;
  if (grid.excluded !== null || !upload) return null;
  if (state === 'read') {
    const leftOut = upload.rowsLeftOut ?? 0;
    return <>{formatCount(upload.rows ?? upload.rowsRead ?? 0)} rows{leftOut > 0 && `; ${formatCount(leftOut)} marked as duplicates left out`}</>;
  }
  if (state === 'reading') {
    const rows = reading?.rowsRead ?? upload.rowsRead ?? 0;
    return (
      <WithBar>
        <ProgressBar label={`Reading grid ${grid.label}`} share={reading?.share ?? null} />
        <span className="text-note text-graphite">{rows > 0 ? `${formatCount(rows)} rows` : 'opening the file'}</span>
      </WithBar>
    );
  }
  if (state === 'rejected') return <>{upload.reasons.length === 1 ? 'One reason' : `${upload.reasons.length} reasons`}</>;
  if (state === 'receiving') return <OpenUpload grid={grid.label} upload={upload} />;
  return null;
}

function SendingProgress({ transfer: { grid, bytes, confirmed, rate, secondsLeft, state, keeps } }: { transfer: Transfer }) {
  if (state === 'failed') return null;
  return (
    <WithBar>
      <ProgressBar label={`Sending grid ${grid}`} share={bytes > 0 ? confirmed / bytes : 0} />
      <span className="text-note text-graphite">
        {formatBytes(confirmed)} of {formatBytes(bytes)}{rate !== null && `, ${formatBytes(rate)}/s`}{secondsLeft !== null && `, ${formatSeconds(secondsLeft)} left`}
        {state === 'waiting' && ', the line is down; tried again by itself'}
        {keeps && <span className="block">{keeps} stays until this one is whole.</span>}
      </span>
    </WithBar>
  );
}
