import { listCasesOfCode } from '@/db/queries/cases';
import { listMatrixStudies, type MatrixStudyRow } from '@/db/queries/matrix-studies';
import { listReleasesOfCode } from '@/db/queries/releases';
import { assessmentSchema } from '@/lib/domain/assessment/schema';
import { caseDefinitionSchema, caseKindSchema } from '@/lib/domain/cases/definition';
import { releaseStateSchema } from '@/lib/domain/codes/schema';
import { buildMatrix } from '@/lib/domain/matrix/build-matrix';
import type { MatrixStudy } from '@/lib/domain/matrix/matrix-input';
import type { Matrix } from '@/lib/domain/matrix/schema';
import { studyStateSchema } from '@/lib/domain/studies/schema';
import { requireCode } from '../codes/require-code';
import type { MemberContext } from '../context';
import { permit } from '../permit';
import { withOrganisation } from '../with-organisation';

export async function getMatrix(ctx: MemberContext, codeKey: string): Promise<Matrix> {
  permit(ctx, 'work.read');
  const at = ctx.organisation.id;
  return withOrganisation(ctx, async (trx) => {
    const { id, slug, name } = await requireCode(ctx, trx, codeKey);
    const releases = await listReleasesOfCode(trx, at, id);
    const cases = await listCasesOfCode(trx, at, id);
    const studies = await listMatrixStudies(trx, at, id);
    return buildMatrix({
      code: { id, slug, name },
      releases: releases.map((row) => ({
        id: row.id, version: row.version, state: releaseStateSchema.parse(row.state), createdAt: row.created_at.getTime(),
      })),
      cases: cases.map((row) => ({
        id: row.id, slug: row.slug, name: row.name, kind: caseKindSchema.parse(row.kind), createdAt: row.created_at.getTime(),
        definition: caseDefinitionSchema.parse(row.definition),
      })),
      studies: studies.map(mapStudy),
    });
  });
}

function mapStudy(row: MatrixStudyRow): MatrixStudy {
  const { assessed_at: at, assessed_revision: revision } = row;
  return {
    id: row.id, caseId: row.case_id, releaseId: row.release_id, revision: row.revision, state: studyStateSchema.parse(row.state),
    gridsRead: row.grids_read, gridsPlanned: row.grids_planned,
    assessed: at === null || revision === null ? null : { revision, at: at.getTime(), assessment: assessmentSchema.parse(row.body) },
  };
}
