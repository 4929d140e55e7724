'use client';

import { useRef, type ClipboardEvent, type KeyboardEvent } from 'react';
import { FaultText } from '../forms/fault-text';
import { TableInput } from '../forms/table-input';
import { Cell, HeadCell, RowHead } from '../tables/cells';
import { Head, Row, Table } from '../tables/table';
import { NormSymbol } from '../ui/symbols';
import { parsePasted, type PastedTable } from './parse-table';
import type { CellFault } from './read-quick';
import { withEmptyRow } from './quick-state';

interface TableEntryProps {
  columns: readonly string[];
  rows: string[][];
  /** What the grid of each row is called. */
  labels: readonly string[];
  faults: readonly CellFault[];
  onChange: (rows: string[][]) => void;
  onPasted: (table: PastedTable) => void;
}

const symbols: Record<string, 'L1' | 'L2' | 'Linf'> = { L1: 'L1', L2: 'L2', 'L∞': 'Linf' };

const placeholders: Record<string, string> = { 'Spacing h': 'h', 'Cells in all': 'cells', 'Cells per direction': 'cells', Value: 'value', L1: 'error', L2: 'error', 'L∞': 'error' };

/** A small table to type or paste into: Enter and the arrow keys move between rows, a new row is always there. */
export function TableEntry({ columns, rows, labels, faults, onChange, onPasted }: TableEntryProps) {
  const table = useRef<HTMLDivElement>(null);
  const setCell = (row: number, column: number, text: string) =>
    onChange(withEmptyRow(rows.map((cells, at) => (at === row ? cells.map((cell, index) => (index === column ? text : cell)) : cells)), columns.length));
  const move = (event: KeyboardEvent, row: number, column: number) => {
    const step = { Enter: 1, ArrowDown: 1, ArrowUp: -1 }[event.key];
    if (step === undefined) return;
    event.preventDefault();
    table.current?.querySelector<HTMLInputElement>(`[data-place="${row + step} ${column}"]`)?.focus();
  };
  const paste = (event: ClipboardEvent, row: number, column: number) => {
    const pasted = parsePasted(event.clipboardData.getData('text/plain'));
    if (!pasted) return;
    event.preventDefault();
    const width = columns.length - column;
    const before = rows.slice(0, row);
    const put = pasted.rows.map((cells, at) => {
      const present = rows[row + at] ?? [];
      return columns.map((_, index) => (index < column ? (present[index] ?? '') : (cells.slice(0, width)[index - column] ?? '')));
    });
    onChange(withEmptyRow([...before, ...put, ...rows.slice(row + put.length)], columns.length));
    onPasted(pasted);
  };
  return (
    <div ref={table}>
      <Table caption="Grids and what was computed on them." hideCaption className="table-fixed">
        <Head><tr><HeadCell className="w-10">Grid</HeadCell>{columns.map((column) => <HeadCell key={column} num className="px-2">{symbols[column] ? <NormSymbol norm={symbols[column]} /> : column}</HeadCell>)}</tr></Head>
        <tbody>
          {rows.map((cells, row) => (
            <Row key={row}>
              <RowHead className="align-middle text-graphite">{labels[row]}</RowHead>
              {columns.map((column, index) => (
                <Cell key={column} className="p-0 pr-0">
                  <TableInput
                    label={`${column}, row ${row + 1}`} value={cells[index] ?? ''} placeholder={row === rows.length - 1 ? placeholders[column] : undefined} data-place={`${row} ${index}`}
                    isFaulty={faults.some((fault) => fault.row === row && fault.column === index)}
                    onChange={(event) => setCell(row, index, event.target.value)}
                    onKeyDown={(event) => move(event, row, index)} onPaste={(event) => paste(event, row, index)}
                  />
                </Cell>
              ))}
            </Row>
          ))}
        </tbody>
      </Table>
      {faults.map(({ row, column, message }) => <FaultText key={`${row} ${column} ${message}`} text={`Row ${row + 1}, ${(columns[column] ?? '').toLowerCase().replace(/^l/, 'L')}: ${message}`} />)}
    </div>
  );
}
