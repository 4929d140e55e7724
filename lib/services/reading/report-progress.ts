import { updateGrid } from '@/db/queries/grids';
import type { ReadProgress } from '@/lib/readers/source';
import type { JobContext } from '../outbox/job-context';
import { announce } from '../studies/announce';
import { withOrganisation } from '../with-organisation';
import type { Reading } from './begin-reading';

/** Pages are told each time; the row, for pages opened meanwhile, is written this seldom. */
const keptEveryMilliseconds = 2000;

/** Tells how far a reading is. Neither a page nor a row left behind stops the reading. */
export function reportProgress(ctx: JobContext, { grid, upload }: Reading): (progress: ReadProgress) => void {
  let keptAt = Date.now();
  const keep = async (rows: number) => {
    try {
      await withOrganisation(ctx, (trx) => updateGrid(trx, ctx.organisation.id, grid.id, { rows_read: rows }, { states: ['reading'], uploadId: upload.id }));
    } catch (error) {
      ctx.log.warn({ gridId: grid.id, fault: error instanceof Error ? error.message : 'unknown' }, 'progress not kept');
    }
  };
  return ({ rows, bytes }) => {
    void announce(ctx, grid.study_id, { event: 'progress', grid: grid.label, rowsRead: rows, bytesRead: bytes, bytes: Number(upload.bytes) });
    if (Date.now() - keptAt < keptEveryMilliseconds) return;
    keptAt = Date.now();
    void keep(rows);
  };
}
