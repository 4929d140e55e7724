import { mostReasons } from '@/lib/domain/uploads/most-reasons';
import type { GridReading } from '@/lib/readers/grid-reading';
import { readGrid } from '@/lib/readers/read-grid';
import { readPreview } from '@/lib/readers/read-preview';
import { RejectedFile } from '@/lib/readers/rejected-file';
import { byteSource } from '@/tests/support/byte-source';

const lastPart = (name: string) => name.slice(Math.max(name.lastIndexOf('/'), name.lastIndexOf('.')) + 1);

/** Columns of the names that seeds have, or the first ones: a file is read as far as can be. */
function readingOf(header: readonly string[]): GridReading {
  const find = (name: string, other: number) => header.find((each) => lastPart(each) === name) ?? header[other] ?? name;
  const weight = header.find((each) => ['w', 'volume'].includes(lastPart(each))) ?? null;
  return { mapping: { x: find('x', 0), weight, fields: { u: find('u', 1) } }, problem: { dimension: 1, exact: { u: 'x' }, constants: {} }, fields: [{ field: 'u' }] };
}

async function orReasons<Result>(work: Promise<Result>): Promise<{ result: Result } | { reasons: RejectedFile['reasons'] }> {
  try {
    return { result: await work };
  } catch (error) {
    if (error instanceof RejectedFile) return { reasons: error.reasons };
    throw error;
  }
}

function findNonFinite(value: unknown, path: string): string | null {
  if (typeof value === 'number') return Number.isFinite(value) ? null : `${path} is ${value}`;
  if (typeof value !== 'object' || value === null) return null;
  for (const [key, each] of Object.entries(value)) {
    const found = findNonFinite(each, `${path}.${key}`);
    if (found !== null) return found;
  }
  return null;
}

/**
 * Reads a file as the product does and says what is wrong with how it went: another error than a rejection, norms that are
 * not finite, no reason or too many, or another answer where its bytes come in other pieces. Null where all is well.
 */
export async function tryFile(bytes: Buffer, cuts: readonly number[]): Promise<string | null> {
  try {
    const preview = await orReasons(readPreview(byteSource(bytes, cuts)));
    const reading = readingOf('result' in preview ? preview.result.header : []);
    const whole = await orReasons(readGrid(byteSource(bytes), reading));
    const cut = await orReasons(readGrid(byteSource(bytes, cuts), reading));
    if (JSON.stringify(whole) !== JSON.stringify(cut)) return `read in pieces it gives ${JSON.stringify(cut).slice(0, 300)}, in one ${JSON.stringify(whole).slice(0, 300)}`;
    if ('reasons' in whole) return whole.reasons.length > 0 && whole.reasons.length <= mostReasons ? null : `${whole.reasons.length} reasons`;
    return findNonFinite(whole.result.norms, 'norms');
  } catch (error) {
    return error instanceof Error ? error.stack ?? error.message : String(error);
  }
}
