import type { GridReading } from '@/lib/readers/grid-reading';
import type { GridReadResult } from '@/lib/readers/read-grid';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { solutionFields } from '@/lib/domain/cases/solution-fields';
import { findDatums, planSecondReading } from './datums';
import { mapFields, planParts, type PartsAsked } from './plan-parts';
import { joinMaps, joinNorms, planReading } from './plan-reading';
import { keepSolutions, planSolutions } from './read-solutions';

interface ToRead extends PartsAsked { statedSha256: string | null }

/** Reads a file into norms; a second time where a constant, a factor or a rigid motion of fields is free and was found by the first. */
export async function readNorms({ statedSha256, ...asked }: ToRead, read: (reading: GridReading) => Promise<GridReadResult>): Promise<GridReadResult> {
  const { definition, problem } = asked;
  const solutions = solutionFields(definition, problem);
  const planned = planSolutions(planReading(asked), solutions);
  const reading = solutions.length === 0 ? { ...planned, ...planParts(asked) } : planned;
  const isFree = ({ datum }: (typeof definition.fields)[number]) => datum === 'mean' || datum === 'scale' || (datum === 'rigid' && reading.rigid !== undefined);
  const namesWhere = (isFreeWanted: boolean) => definition.fields.filter((field) => isFree(field) === isFreeWanted).map(({ field }) => field);
  const first = await read(mapFields(reading, namesWhere(false)));
  if (statedSha256 !== null && statedSha256 !== first.sha256) {
    throw new RejectedFile([{ code: 'checksum-differs', count: 1, line: null, column: null, found: first.sha256, expected: statedSha256 }]);
  }
  const norms = keepSolutions(first.norms, solutions);
  const datums = findDatums(definition, norms);
  const again = planSecondReading(reading, datums);
  const second = again && (await read(mapFields(again, namesWhere(true))));
  return {
    ...first, norms: joinNorms(definition, norms, { second: second && second.norms, datums }), maps: joinMaps(first.maps, second?.maps ?? [], datums),
  };
}
