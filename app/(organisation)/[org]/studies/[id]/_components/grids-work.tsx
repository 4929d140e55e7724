'use client';

import { useRef, useState, type DragEvent } from 'react';
import { NeedsEngineer } from '@/app/_components/organisation/needs-engineer';
import { useOrganisation } from '@/app/_components/organisation/organisation-context';
import { HeadCell } from '@/app/_components/tables/cells';
import { Head, Table } from '@/app/_components/tables/table';
import { Button } from '@/app/_components/ui/button';
import { DateTime } from '@/app/_components/ui/date-time';
import { matchFiles } from '@/lib/domain/uploads/match-files';
import type { Grid, Study } from '@/lib/domain/studies/schema';
import { takesFiles } from '@/lib/domain/studies/takes-files';
import { AddGrid } from './add-grid';
import { FilesToPlace, type PlacedFile } from './files-to-place';
import { UploadRow } from './upload-row';
import type { Transfer } from './sending/transfer';
import { useSend } from './sending/use-send';
import { useUploads } from './sending/use-uploads';
import type { Reading } from './use-study-events';

interface GridsWorkProps {
  study: Study; readings: ReadonlyMap<string, Reading>;
  /** Opens the table of typed values; null where it is open or there is nothing to type. */
  onType: (() => void) | null;
}

const takesFile = ({ state, excluded }: Grid) => excluded === null && (state === 'expected' || state === 'rejected' || state === 'receiving' || state === 'needs-columns');

const isSending = (transfer: Transfer | undefined) => transfer !== undefined && !transfer.isElsewhere && transfer.state !== 'failed';

/** The grids while the study collects: drop the files of several at once, watch them, add a grid or leave one out. */
export function GridsWork({ study, readings, onType }: GridsWorkProps) {
  const { may } = useOrganisation();
  const { uploader, transfers } = useUploads(study);
  const sender = useSend({ study, uploader, transfers });
  const [toPlace, setToPlace] = useState<readonly PlacedFile[] | null>(null);
  const [isOver, setIsOver] = useState(false);
  const [isAdding, setIsAdding] = useState(false);
  const input = useRef<HTMLInputElement>(null);
  const chosenGrid = useRef<string | null>(null);
  const mayChange = may('work.write');
  const comparesFiles = takesFiles(study.definition);
  const grids = [...study.grids].reverse();
  const sending = [...transfers.values()].filter(({ state, isElsewhere }) => !isElsewhere && state !== 'paused' && state !== 'failed').length;

  const send = (files: readonly { file: File; grid: string }[]) => {
    setToPlace(null);
    sender.send(files);
  };
  const take = (list: FileList | null) => {
    const files = [...(list ?? [])];
    const one = chosenGrid.current;
    chosenGrid.current = null;
    if (files.length === 0) return;
    if (one !== null && files[0] && files.length === 1) { send([{ file: files[0], grid: one }]); return; }
    const open = grids.filter((grid) => takesFile(grid) && !isSending(transfers.get(grid.label)));
    const found = matchFiles(files, open.length >= files.length ? open : grids.filter(({ excluded }) => excluded === null), study.dimension);
    const placed = files.map((file, index) => ({ file, grid: found[index] ?? null }));
    const areClear = placed.every(({ grid }) => grid !== null && open.some(({ label }) => label === grid));
    if (areClear) send(placed.flatMap(({ file, grid }) => (grid === null ? [] : [{ file, grid }])));
    else setToPlace(placed);
  };
  const choose = (grid: string | null) => {
    chosenGrid.current = grid;
    if (input.current) input.current.multiple = grid === null;
    input.current?.click();
  };
  const drop = (event: DragEvent) => {
    event.preventDefault();
    setIsOver(false);
    if (mayChange && comparesFiles) take(event.dataTransfer.files);
  };
  return (
    <div className="mt-12">
      <h2 className="mb-3 font-serif text-section font-semibold">Grids</h2>
      <div
        onDragOver={(event) => { if (mayChange && comparesFiles) { event.preventDefault(); setIsOver(true); } }}
        onDragLeave={() => setIsOver(false)} onDrop={drop} className={isOver ? 'bg-wash outline-2 outline-offset-8 outline-pen outline-dashed' : ''}
      >
        <Table caption="Grids, coarse to fine, and their files." hideCaption>
          <Head><tr><HeadCell>Grid, file</HeadCell><HeadCell num>Size</HeadCell><HeadCell>State</HeadCell><HeadCell>Progress</HeadCell><HeadCell className="max-tablet:hidden"><span className="sr-only">Actions</span></HeadCell></tr></Head>
          <tbody>
            {grids.map((grid) => (
              <UploadRow
                key={grid.label} study={study} grid={grid} transfer={transfers.get(grid.label)} reading={readings.get(grid.label)} uploader={uploader} sender={sender}
                mayChange={mayChange} onChoose={comparesFiles ? () => choose(grid.label) : null}
              />
            ))}
          </tbody>
        </Table>
        {comparesFiles && mayChange && <p className="mt-2 text-note text-graphite">Drop several files here at once; each finds its grid by name and size.</p>}
      </div>
      {toPlace && <FilesToPlace key={toPlace.map(({ file }) => file.name).join(' ')} files={toPlace} grids={grids.filter(({ excluded }) => excluded === null)} onSend={send} onCancel={() => setToPlace(null)} />}
      {mayChange ? (
        <div className="mt-4 flex flex-wrap items-center gap-3">
          {comparesFiles && <Button kind="primary" onClick={() => choose(null)}>Upload files</Button>}
          <Button aria-expanded={isAdding} onClick={() => setIsAdding(!isAdding)}>Add a grid</Button>
          {onType && <Button onClick={onType}>Type norms instead</Button>}
          <span role="status" className="text-note text-graphite">{sending > 0 && `Sending ${sending} ${sending === 1 ? 'file' : 'files'}. You may read other pages meanwhile.`}</span>
        </div>
      ) : <div className="mt-4"><NeedsEngineer what="send files or change grids" /></div>}
      <input ref={input} type="file" multiple hidden data-testid="files" aria-hidden tabIndex={-1} onChange={(event) => { take(event.target.files); event.target.value = ''; }} />
      {isAdding && <AddGrid study={study} onDone={() => setIsAdding(false)} />}
    </div>
  );
}

/** What a file may be, and what the plan has to do with it. */
export function GridsNotes({ study }: { study: Study }) {
  return (
    <div className="mt-4 flex flex-col gap-2">
      {takesFiles(study.definition) && (
        <p>Files are text tables (comma, semicolon, tab or space), JSON (columns or records), HDF5, HDF5/JSON or VTK XML; gzip or not. They go straight to storage: <b>progress counts confirmed bytes</b>, reading counts rows.</p>
      )}
      <p>
        {study.planFrozenAt === null
          ? 'The plan is frozen with the first data; what changes later is marked “after data”.'
          : <><b>Plan frozen</b> <DateTime value={study.planFrozenAt} show="both" />, before the first data. What changes now is marked “after data”.</>}
      </p>
    </div>
  );
}
