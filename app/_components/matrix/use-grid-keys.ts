'use client';

import { useState, type KeyboardEvent, type RefObject } from 'react';

export interface GridPlace { row: number; column: number }

const steps: Record<string, (at: GridPlace, last: GridPlace) => GridPlace> = {
  ArrowLeft: ({ row, column }) => ({ row, column: column - 1 }),
  ArrowRight: ({ row, column }) => ({ row, column: column + 1 }),
  ArrowUp: ({ row, column }) => ({ row: row - 1, column }),
  ArrowDown: ({ row, column }) => ({ row: row + 1, column }),
  Home: ({ row }) => ({ row, column: 0 }),
  End: ({ row }, last) => ({ row, column: last.column }),
};

/** One tab stop for a table of cells, and the arrow keys between them. Cells carry `data-place="row column"`. */
export function useGridKeys(table: RefObject<HTMLElement | null>, size: { rows: number; columns: number }, start: GridPlace) {
  const [current, setCurrent] = useState(start);
  const last = { row: size.rows - 1, column: size.columns - 1 };
  const onKeyDown = (event: KeyboardEvent) => {
    const step = steps[event.key];
    if (!step) return;
    event.preventDefault();
    const { row, column } = step(current, last);
    const next = { row: Math.min(last.row, Math.max(0, row)), column: Math.min(last.column, Math.max(0, column)) };
    setCurrent(next);
    table.current?.querySelector<HTMLElement>(`[data-place="${next.row} ${next.column}"]`)?.focus();
  };
  return { current, setCurrent, onKeyDown };
}
