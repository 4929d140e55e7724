import { TextButton } from '@/app/_components/ui/text-link';
import type { Transfer } from './transfer';
import type { Uploader } from './uploader';

interface TransferActionsProps { transfer: Transfer; uploader: Uploader; onChoose: (() => void) | null }

/** What can be done about a file on its way. */
export function TransferActions({ transfer: { grid, state, mayRetry, isElsewhere }, uploader, onChoose }: TransferActionsProps) {
  if (isElsewhere) return null;
  const pauses = state === 'paused' ? 'Resume' : 'Pause';
  return (
    <>
      {state === 'failed' && mayRetry && <TextButton aria-label={`Retry, grid ${grid}`} onClick={() => uploader.retry(grid)}>Retry</TextButton>}
      {state === 'failed' && !mayRetry && onChoose && <TextButton aria-label={`Choose a file, grid ${grid}`} onClick={onChoose}>Choose a file</TextButton>}
      {state !== 'failed' && state !== 'checking' && <TextButton aria-label={`${pauses}, grid ${grid}`} onClick={() => uploader.pauseOrResume(grid)}>{pauses}</TextButton>}
      <TextButton aria-label={`Give up, grid ${grid}`} onClick={() => uploader.giveUp(grid)}>Give up</TextButton>
    </>
  );
}
