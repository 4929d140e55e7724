'use client';

import { useRef, useState, type ClipboardEvent, type KeyboardEvent } from 'react';
import { FaultText } from '@/app/_components/forms/fault-text';
import { ProblemNotice } from '@/app/_components/forms/problem-notice';
import { TableInput } from '@/app/_components/forms/table-input';
import { parsePasted } from '@/app/_components/quick-check/parse-table';
import { Cell, HeadCell, RowHead } from '@/app/_components/tables/cells';
import { Head, Row, Table } from '@/app/_components/tables/table';
import { Button } from '@/app/_components/ui/button';
import { Section } from '@/app/_components/ui/section';
import { NormSymbol, Sym } from '@/app/_components/ui/symbols';
import type { Study } from '@/lib/domain/studies/schema';
import { gridSize } from './grid-size';
import { readCells, typedColumns, typedText, type TypedColumn } from './typed-columns';
import { useGridChange } from './use-grid-change';

interface CellFault { row: number; column: number; found: string }

const nameOf = (column: TypedColumn) => (column.kind === 'value' ? column.name : `${column.norm === 'Linf' ? 'L∞' : column.norm} of ${column.field}`);

/** Values of quantities, or norms that the solver computed itself, typed or pasted grid by grid. */
export function TypedSection({ study }: { study: Study }) {
  const columns = typedColumns(study);
  const comparesFiles = study.definition.fields.length > 0;
  return (
    <Section
      heading={comparesFiles ? 'Norms from the solver' : 'Values'}
      note={<p>Paste from a spreadsheet into any cell. Type every digit you have, trailing zeros too: the last digit is the resolution.</p>}
    >
      <TypedTable study={study} columns={columns} />
    </Section>
  );
}

function TypedTable({ study, columns }: { study: Study; columns: readonly TypedColumn[] }) {
  const grids = [...study.grids].reverse().filter(({ excluded, upload }) => excluded === null && upload === null);
  const [edited, setEdited] = useState<ReadonlyMap<string, readonly string[]>>(new Map());
  const [fault, setFault] = useState<CellFault | null>(null);
  const table = useRef<HTMLDivElement>(null);
  const { change, isChanging, problem } = useGridChange(study, 'Not saved');
  const rows = grids.map((grid) => edited.get(grid.label) ?? columns.map((column) => typedText(grid, column)));

  const put = (row: number, column: number, cells: readonly (readonly string[])[]) => {
    const next = new Map(edited);
    cells.forEach((given, at) => {
      const grid = grids[row + at];
      const present = rows[row + at];
      if (grid && present) next.set(grid.label, present.map((text, index) => given[index - column] ?? text));
    });
    setEdited(next);
    setFault(null);
  };
  const paste = (event: ClipboardEvent, row: number, column: number) => {
    const pasted = parsePasted(event.clipboardData.getData('text/plain'));
    if (!pasted) return;
    event.preventDefault();
    put(row, column, pasted.rows);
  };
  const move = (event: KeyboardEvent, row: number, column: number) => {
    const step = { Enter: 1, ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    table.current?.querySelector<HTMLInputElement>(`[data-place="${row + step} ${column}"]`)?.focus();
  };
  const save = async () => {
    const changes = [];
    for (const [row, grid] of grids.entries()) {
      if (!edited.has(grid.label)) continue;
      const read = readCells(columns, rows[row] ?? []);
      if (!read.ok) {
        setFault({ row, column: read.column, found: read.found });
        return;
      }
      changes.push({ grid, change: read.change });
    }
    await change(changes).then(() => setEdited(new Map()), () => undefined);
  };
  return (
    <div ref={table}>
      <Table caption="Values of each grid, coarse to fine." hideCaption>
        <Head>
          <tr>
            <HeadCell>Grid</HeadCell>
            {columns.map((column) => (
              <HeadCell key={nameOf(column)} num className="px-2">
                {column.kind === 'value' ? <>{column.name}{column.unit && `, ${column.unit}`}</> : <><NormSymbol norm={column.norm} /> of <Sym>{column.field}</Sym></>}
              </HeadCell>
            ))}
          </tr>
        </Head>
        <tbody>
          {grids.map((grid, row) => (
            <Row key={grid.label}>
              <RowHead className="align-middle whitespace-nowrap">{grid.label} <span className="text-graphite">{gridSize(grid, study.dimension)}</span></RowHead>
              {columns.map((column, index) => (
                <Cell key={nameOf(column)} className="min-w-28 p-0 pr-0">
                  <TableInput
                    label={`${nameOf(column)}, grid ${grid.label}`} value={rows[row]?.[index] ?? ''} data-place={`${row} ${index}`}
                    isFaulty={fault?.row === row && fault.column === index}
                    onChange={(event) => put(row, index, [[event.target.value]])} onPaste={(event) => paste(event, row, index)} onKeyDown={(event) => move(event, row, index)}
                  />
                </Cell>
              ))}
            </Row>
          ))}
        </tbody>
      </Table>
      {fault && <FaultText text={`Not a number. Found “${fault.found}” at grid ${grids[fault.row]?.label ?? ''}. Expected a number such as 0.1 or 0,1.`} />}
      <ProblemNotice problem={problem} />
      <div className="mt-4"><Button kind="primary" disabled={isChanging} unavailable={edited.size === 0 ? 'nothing typed yet' : undefined} onClick={() => void save()}>Save values</Button></div>
    </div>
  );
}
