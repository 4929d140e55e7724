'use client';

import { useState } from 'react';
import { Cell, HeadCell, RowHead } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { Button } from '@/app/_components/ui/button';
import { formatBytes } from '@/lib/domain/numbers/format-bytes';
import type { Grid } from '@/lib/domain/studies/schema';

export interface PlacedFile { file: File; grid: string | null }
interface FilesToPlaceProps { files: readonly PlacedFile[]; grids: readonly Grid[]; onSend: (files: { file: File; grid: string }[]) => void; onCancel: () => void }

/** Files whose names and sizes do not tell the grid, or that would replace others: the person says which is which. */
export function FilesToPlace({ files, grids, onSend, onCancel }: FilesToPlaceProps) {
  const [chosen, setChosen] = useState(files.map(({ grid }) => grid));
  const repeated = chosen.filter((grid, index) => grid !== null && chosen.indexOf(grid) < index);
  const placed = files.flatMap(({ file }, index) => (chosen[index] ? [{ file, grid: chosen[index] }] : []));
  const fault = repeated.length > 0 ? `Grid ${repeated[0]} has two files.` : placed.length === 0 ? 'No file has a grid yet.' : null;
  return (
    <div role="group" aria-label="Files to place" className="mt-6">
      <Table caption="Which grid each file belongs to. Nothing is sent before you say so.">
        <Head><tr><HeadCell>File</HeadCell><HeadCell num>Size</HeadCell><HeadCell afterNumber>Grid</HeadCell></tr></Head>
        <tbody>
          {files.map(({ file }, index) => (
            <Row key={`${file.name} ${file.size} ${index}`}>
              <RowHead className="break-all">{file.name}</RowHead>
              <Cell num>{formatBytes(file.size)}</Cell>
              <Cell afterNumber>
                <select
                  aria-label={`Grid of ${file.name}`} value={chosen[index] ?? ''}
                  onChange={(event) => setChosen(chosen.map((grid, at) => (at === index ? event.target.value || null : grid)))}
                  className="min-h-11 cursor-pointer bg-transparent underline decoration-rule/60 decoration-1 underline-offset-3 tablet:min-h-6"
                >
                  <option value="" className="bg-paper">none, do not send</option>
                  {grids.map((grid) => <option key={grid.label} value={grid.label} className="bg-paper">{grid.label}{grid.upload ? `, replaces ${grid.upload.filename}` : ''}</option>)}
                </select>
              </Cell>
            </Row>
          ))}
        </tbody>
      </Table>
      <div className="mt-3 flex flex-wrap items-center gap-3">
        <Button kind="primary" unavailable={fault} onClick={() => onSend(placed)}>Send {placed.length === 1 ? 'the file' : `${placed.length} files`}</Button>
        <Button onClick={onCancel}>Send none</Button>
      </div>
    </div>
  );
}
