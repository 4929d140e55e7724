import { describe, expect, it } from 'vitest';
import { createNormTotal } from '@/lib/numerics/norms/combine-norms';
import { createNormGatherer, createNormRooms } from '@/lib/numerics/norms/norm-gatherer';
import { createTableMemory } from '@/lib/readers/table/table-memory';
import { createExactSum, relativeError } from '@/tests/support/exact-sum';
import { seeded } from '@/tests/support/random';

const rows = 10_000_000;
const block = 2000;
const partRows = 40_000;

/**
 * Ten million errors of 20 bits and of any magnitude from 1e-12 to 1e3, with weights of 3 bits: every term w|e|, we and we²
 * is a double, so that exact whole numbers say what their sums are.
 */
function gatherAll(isInEngine: boolean) {
  const { engine } = createTableMemory();
  const allocate = () => (isInEngine ? engine.allocate(block) : new Float64Array(block));
  const [x, weights, values, exact] = [allocate(), allocate(), allocate(), allocate()];
  const rooms = createNormRooms(1, isInEngine ? engine : null);
  const sums = { weight: createExactSum(), absolute: createExactSum(), signed: createExactSum(), square: createExactSum() };
  const total = createNormTotal(['u']);
  const random = seeded(7);
  let gatherer = createNormGatherer(['u'], rooms);
  for (let from = 0; from < rows; from += block) {
    for (let i = 0; i < block; i += 1) {
      const weight = 1 + Math.floor(random() * 7);
      const error = (Math.floor(random() * 2 ** 20) / 2 ** 20) * 2 ** Math.floor(random() * 50 - 40) * (random() < 0.4 ? -1 : 1);
      weights[i] = weight;
      values[i] = error;
      sums.weight.add(weight);
      sums.absolute.add(weight * Math.abs(error));
      sums.signed.add(weight * error);
      sums.square.add(weight * error * error);
    }
    gatherer.add({ rows: block, x, y: null, z: null, weights, fields: [{ values, exact }] });
    if ((from + block) % partRows !== 0) continue;
    total.add(gatherer.part());
    gatherer = createNormGatherer(['u'], rooms);
  }
  return { sums, norms: total.finish([null])! };
}

describe('sums of ten million rows of mixed magnitude', () => {
  it.each([['loops of the language', false], ['the memory of a table', true]])('agree with exact ones to 1e-14, in %s', (_, isInEngine) => {
    const { sums, norms } = gatherAll(isInEngine);
    const [field] = norms.fields;
    const weight = norms.weightSum;
    expect(relativeError(weight, sums.weight.numerator())).toBe(0);
    expect(Math.abs(relativeError(field!.L1 * weight, sums.absolute.numerator()))).toBeLessThan(1e-14);
    expect(Math.abs(relativeError(field!.mean * weight, sums.signed.numerator()))).toBeLessThan(1e-14);
    expect(Math.abs(relativeError(field!.L2 ** 2 * weight, sums.square.numerator()))).toBeLessThan(1e-14);
  }, 60_000);
});
