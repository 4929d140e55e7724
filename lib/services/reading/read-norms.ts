import type { CaseDefinition } from '@/lib/domain/cases/definition';
import type { ColumnMapping } from '@/lib/domain/columns/column-mapping';
import type { ProblemDefinition } from '@/lib/domain/problems/schema';
import type { GridReading } from '@/lib/readers/grid-reading';
import type { GridReadResult } from '@/lib/readers/read-grid';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { solutionFields } from '@/lib/domain/cases/solution-fields';
import { findDatums, planSecondReading } from './datums';
import { joinNorms, planReading } from './plan-reading';
import { keepSolutions, planSolutions } from './read-solutions';

interface ToRead {
  definition: CaseDefinition;
  problem: ProblemDefinition;
  mapping: ColumnMapping;
  t?: number;
  cellsPerDirection?: number | number[];
  statedSha256: string | null;
}

/** Reads a file into norms; a second time where a constant, a factor or a rigid motion of fields is free and was found by the first. */
export async function readNorms({ statedSha256, ...asked }: ToRead, read: (reading: GridReading) => Promise<GridReadResult>): Promise<GridReadResult> {
  const { definition, problem } = asked;
  const solutions = solutionFields(definition, problem);
  const reading = planSolutions(planReading(asked), solutions);
  const first = await read(reading);
  if (statedSha256 !== null && statedSha256 !== first.sha256) {
    throw new RejectedFile([{ code: 'checksum-differs', count: 1, line: null, column: null, found: first.sha256, expected: statedSha256 }]);
  }
  const norms = keepSolutions(first.norms, solutions);
  const datums = findDatums(definition, norms);
  const again = planSecondReading(reading, datums);
  const second = again ? (await read(again)).norms : null;
  return { ...first, norms: joinNorms(definition, norms, { second, datums }) };
}
