import type { CaseRow } from '@/db/queries/cases';
import { caseDefinitionSchema, caseKindSchema } from '@/lib/domain/cases/definition';
import type { Case } from '@/lib/domain/cases/schema';
import { columnMappingSchema } from '@/lib/domain/columns/column-mapping';

export function mapCase(row: CaseRow): Case {
  return {
    ...caseDefinitionSchema.parse(row.definition),
    id: row.id, slug: row.slug, name: row.name, kind: caseKindSchema.parse(row.kind), revision: row.revision,
    code: { id: row.code_id, slug: row.code_slug, name: row.code_name },
    problem: { id: row.problem_id, slug: row.problem_slug, name: row.problem_name },
    columns: columnMappingSchema.nullable().parse(row.columns),
    createdAt: row.created_at.toISOString(), changedAt: row.changed_at.toISOString(), changedBy: row.changed_by,
  };
}
