'use client';

import { useState } from 'react';
import { Cell, ReasonRow, RowHead } from '@/app/_components/tables/cells';
import { Row } from '@/app/_components/tables/table';
import { TextButton } from '@/app/_components/ui/text-link';
import { mostReasons } from '@/lib/domain/uploads/most-reasons';
import { describeRejection } from '@/lib/domain/uploads/rejection-text';
import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import type { Grid, GridState, Study } from '@/lib/domain/studies/schema';
import { gridSize } from './grid-size';
import { LeaveOut } from './leave-out';
import { OpenState } from './sending/open-upload';
import { SendQuestion } from './sending/send-question';
import type { Transfer } from './sending/transfer';
import { TransferActions } from './sending/transfer-actions';
import { UploadProgress } from './sending/upload-progress';
import type { Uploader } from './sending/uploader';
import type { useSend } from './sending/use-send';
import { useGridChange } from './use-grid-change';
import type { Reading } from './use-study-events';

const stateWords: Record<GridState, string> = {
  expected: 'expected', typed: 'typed', receiving: 'half sent', stored: 'waits to be read', 'needs-columns': 'needs columns', reading: 'reading', read: 'read', rejected: 'rejected',
};
const transferWords: Record<Transfer['state'], string> = { queued: 'waits its turn', sending: 'receiving', waiting: 'waiting', paused: 'paused', checking: 'checking', failed: 'not sent' };
const uploadColumns = 5;

interface UploadRowProps {
  study: Study; grid: Grid; transfer: Transfer | undefined; reading: Reading | undefined; uploader: Uploader | null;
  sender: ReturnType<typeof useSend>;
  mayChange: boolean;
  /** Opens the choice of a file for this grid; null where the case compares no files. */
  onChoose: (() => void) | null;
}

/** A grid while the study collects: its file, how far it is, and what to do about it. */
export function UploadRow({ study, grid, transfer, reading, uploader, sender, mayChange, onChoose }: UploadRowProps) {
  const [isLeavingOut, setIsLeavingOut] = useState(false);
  const { change, problem } = useGridChange(study, 'Not changed');
  const isOut = grid.excluded !== null;
  const isBad = !transfer && !isOut && grid.state === 'rejected';
  const filename = transfer?.filename ?? grid.upload?.filename;
  const bytes = transfer?.bytes ?? grid.upload?.bytes;
  const size = gridSize(grid, study.dimension);
  const question = sender.questions.get(grid.label);
  const sendFault = sender.faults.get(grid.label);
  const reasons = isBad ? (grid.upload?.reasons ?? []) : [];
  const chooseWords = grid.upload ? 'Replace file' : 'Choose a file';
  const actions = mayChange && (
    <span className="flex flex-wrap gap-x-3 gap-y-1 max-tablet:flex-nowrap max-tablet:whitespace-nowrap max-tablet:[&>button]:min-h-11">
      {transfer && uploader ? <TransferActions transfer={transfer} uploader={uploader} onChoose={onChoose} /> : (
        <>
          {!isOut && onChoose && <TextButton aria-label={`${chooseWords}, grid ${grid.label}`} onClick={onChoose}>{chooseWords}</TextButton>}
          {isOut
            ? <TextButton aria-label={`Take grid ${grid.label} back in`} onClick={() => void change([{ grid, change: { exclude: null } }]).catch(() => undefined)}>Take back in</TextButton>
            : <TextButton aria-expanded={isLeavingOut} aria-label={`Leave grid ${grid.label} out`} onClick={() => setIsLeavingOut(!isLeavingOut)}>Leave out</TextButton>}
        </>
      )}
    </span>
  );
  return (
    <>
      <Row className={`${isBad ? '!border-t-[1.5px] !border-fail' : ''} ${isOut ? 'text-graphite' : ''}`}>
        <RowHead>
          <span className="whitespace-nowrap">{grid.label}{size && <span className="text-graphite">, {size}</span>}</span>
          {grid.afterData && <i className="ml-1 text-note text-graphite">after data</i>}
          {filename && <span className="block break-all text-note text-graphite">{filename}</span>}
          <span className="tablet:hidden">{actions}</span>
        </RowHead>
        <Cell num>{bytes === undefined ? '' : formatBytes(bytes)}</Cell>
        <Cell className="whitespace-nowrap" aria-live="polite">
          {isOut ? 'left out' : transfer ? <span className={transfer.state === 'failed' ? 'font-semibold text-fail-text' : ''}>{transferWords[transfer.state]}{transfer.isElsewhere && ' in another tab'}</span>
            : <span className={isBad ? 'font-semibold text-fail-text' : grid.state === 'needs-columns' ? 'font-semibold' : ''}>{grid.state === 'receiving' && grid.upload ? <OpenState upload={grid.upload} /> : stateWords[grid.state]}</span>}
        </Cell>
        <Cell className="w-[34%] min-w-28 tablet:min-w-44"><UploadProgress grid={grid} transfer={transfer} reading={reading} /></Cell>
        <Cell className="min-w-32 max-tablet:hidden">{actions}</Cell>
      </Row>
      {isOut && <ReasonRow columns={uploadColumns}>{grid.excluded}</ReasonRow>}
      {question && <ReasonRow columns={uploadColumns}><SendQuestion question={question} onReplace={() => sender.replace(question)} onDismiss={() => sender.dismiss(grid.label)} /></ReasonRow>}
      {sendFault && <ReasonRow columns={uploadColumns}><span role="status">{sendFault}</span></ReasonRow>}
      {transfer?.fault && <ReasonRow columns={uploadColumns}><span className="text-fail-text">{transfer.fault}</span></ReasonRow>}
      {problem && <ReasonRow columns={uploadColumns}><span role="alert" className="text-fail-text">{problem.detail}</span></ReasonRow>}
      {reasons.length > 0 && (
        <ReasonRow columns={uploadColumns}>
          <ul className="flex flex-col gap-1">
            {reasons.map((reason) => {
              const { sentence, nextStep } = describeRejection(reason);
              return <li key={`${reason.code} ${reason.line} ${reason.column}`}><span className="text-ink">{sentence}</span> {nextStep}</li>;
            })}
            {reasons.length >= mostReasons && <li>These are the first {mostReasons} kinds of faults; there may be more.</li>}
          </ul>
        </ReasonRow>
      )}
      {isLeavingOut && mayChange && !isOut && <ReasonRow columns={uploadColumns}><LeaveOut study={study} grid={grid} onClose={() => setIsLeavingOut(false)} /></ReasonRow>}
    </>
  );
}
