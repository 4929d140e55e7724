import { updateCaseColumns } from '@/db/queries/cases';
import { resumeWaitingGrids } from '@/db/queries/waiting-grids';
import { checkColumns } from '@/lib/domain/cases/check-columns';
import { caseDefinitionSchema } from '@/lib/domain/cases/definition';
import type { Case } from '@/lib/domain/cases/schema';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import { problemDefinitionSchema } from '@/lib/domain/problems/schema';
import type { MemberContext } from '../context';
import { enqueueJob } from '../outbox/enqueue-job';
import { permit } from '../permit';
import { refuseFaults } from '../refuse';
import { announce } from '../studies/announce';
import { withOrganisation } from '../with-organisation';
import { mapCase } from './map-case';
import { requireCase } from './require-case';

/** Keeps the mapping of the case and, in the same transaction, queues the reading of files that waited for it. */
export async function putColumns(ctx: MemberContext, key: string, mapping: ColumnMapping): Promise<Case> {
  permit(ctx, 'work.write');
  const { updated, resumed } = await withOrganisation(ctx, async (trx) => {
    const row = await requireCase(ctx, trx, key);
    refuseFaults(checkColumns(mapping, caseDefinitionSchema.parse(row.definition), problemDefinitionSchema.parse(row.problem_definition)));
    await updateCaseColumns(trx, ctx.organisation.id, row.id, mapping);
    const grids = await resumeWaitingGrids(trx, ctx.organisation.id, row.id);
    for (const grid of grids) {
      await enqueueJob(trx, { organisationId: ctx.organisation.id, job: 'grid.read', subjectId: grid.id, subjectRevision: null });
    }
    return { updated: mapCase(await requireCase(ctx, trx, row.id)), resumed: grids };
  });
  for (const { study_id, label } of resumed) {
    await announce(ctx, study_id, { event: 'state', state: 'collecting', grid: label, gridState: 'stored' });
  }
  return updated;
}
