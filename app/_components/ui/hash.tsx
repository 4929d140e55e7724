'use client';

import type { ClipboardEvent } from 'react';

/** A content hash, first and last four signs, or in groups of four; copying it gives the whole. */
export function Hash({ value, full }: { value: string; full?: boolean }) {
  const shown = full ? (value.match(/.{1,4}/g) ?? []).join(' ') : `${value.slice(0, 4)}…${value.slice(-4)}`;
  const copyWhole = (event: ClipboardEvent) => {
    event.preventDefault();
    event.clipboardData.setData('text/plain', value);
  };
  return <code title={value} onCopy={copyWhole} className="break-words font-mono text-code">{shown}</code>;
}
