import type { GridRow } from '@/db/queries/grids';
import type { Grid } from '@/lib/domain/studies/schema';
import type { RejectionReason } from '@/lib/domain/uploads/rejection';
import { definitionOf, normsOf, stateOf } from './grid-definition';

export function mapGrid(row: GridRow): Grid {
  const norms = normsOf(row);
  return {
    label: row.label, ...definitionOf(row), state: stateOf(row), revision: row.revision, excluded: row.excluded, afterData: row.after_data,
    upload: row.upload_id === null ? null : {
      id: row.upload_id, filename: row.filename ?? '', bytes: Number(row.bytes ?? 0), sha256: row.sha256,
      rowsRead: row.rows_read === null ? null : Number(row.rows_read), rows: norms?.rows ?? null,
      ...(norms?.rowsLeftOut !== undefined && { rowsLeftOut: norms.rowsLeftOut }),
      createdBy: row.sender ?? '', createdAt: (row.sent_at ?? row.created_at).toISOString(),
      reasons: row.reasons as unknown as RejectionReason[],
    },
  };
}
