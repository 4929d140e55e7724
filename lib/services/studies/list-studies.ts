import type { z } from 'zod';
import { findCaseBinding } from '@/db/queries/case-bindings';
import { listStudies as listStudyRows, type StudyListRow } from '@/db/queries/studies';
import { listReleasesNamed } from '@/db/queries/releases';
import { outcomeSchema } from '@/lib/domain/assessment/schema';
import { studyStateSchema, type listStudiesQuerySchema, type StudySummary } from '@/lib/domain/studies/schema';
import type { MemberContext } from '../context';
import { keyOf } from '../keys';
import { endPage, startPage } from '../list-page';
import { permit } from '../permit';
import { withOrganisation, type Trx } from '../with-organisation';

type ListStudiesQuery = z.output<typeof listStudiesQuerySchema>;

function mapSummary(row: StudyListRow): StudySummary {
  return {
    id: row.id,
    code: { id: row.code_id, slug: row.code_slug, name: row.code_name },
    release: { id: row.release_id, version: row.release_version },
    case: { id: row.case_id, slug: row.case_slug, name: row.case_name },
    state: studyStateSchema.parse(row.state), revision: row.revision,
    outcome: outcomeSchema.nullable().parse(row.outcome), reasons: (row.reasons ?? []) as unknown as StudySummary['reasons'],
    createdAt: row.created_at.toISOString(), stateSince: row.state_since.toISOString(),
  };
}

/** Ids that the filter's words stand for; null where nothing answers to one of them. */
async function resolveFilter(ctx: MemberContext, trx: Trx, query: ListStudiesQuery) {
  const caseId = query.case === undefined ? null : (await findCaseBinding(trx, ctx.organisation.id, keyOf(query.case)))?.id;
  const releaseIds = query.release === undefined ? null : (await listReleasesNamed(trx, ctx.organisation.id, keyOf(query.release))).map(({ id }) => id);
  if (caseId === undefined || releaseIds?.length === 0) return null;
  return { caseId, releaseIds, codeId: ctx.token?.codeId ?? null, state: query.state ?? null };
}

export async function listStudies(ctx: MemberContext, query: ListStudiesQuery): Promise<{ items: StudySummary[]; nextCursor: string | null }> {
  permit(ctx, 'work.read');
  const page = startPage(query);
  const rows = await withOrganisation(ctx, async (trx) => {
    const filter = await resolveFilter(ctx, trx, query);
    return filter ? listStudyRows(trx, ctx.organisation.id, filter, page) : [];
  });
  return endPage(rows, query, mapSummary);
}
