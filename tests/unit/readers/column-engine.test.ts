import { describe, expect, it } from 'vitest';
import { evaluateBinary, type Operands } from '@/lib/numerics/expression/evaluate-binary';
import { evaluateUnary } from '@/lib/numerics/expression/evaluate-unary';
import type { BinaryOperation, UnaryOperation } from '@/lib/numerics/expression/node';
import { addErrors, addWeights, beginState, place, stateLength, weightLength } from '@/lib/numerics/norms/run-sums';
import { createTableMemory } from '@/lib/readers/table/table-memory';
import { seeded } from '@/tests/support/random';

const random = seeded(20_261_201);
const { engine } = createTableMemory();

/** A column in the memory of the engine. */
function column(values: ArrayLike<number>): Float64Array {
  const room = engine.allocate(values.length);
  room.set(values);
  return room;
}

/** Angles of every size, multiples of π/2 and their neighbours, and what is no angle. */
const angles: readonly (() => number)[] = [
  () => (random() - 0.5) * 2 * Math.PI,
  () => (random() - 0.5) * 200,
  () => (random() - 0.5) * 10 ** (random() * 30 - 15),
  () => (Math.round((random() - 0.5) * 1000) * Math.PI) / 2,
  () => ((Math.round((random() - 0.5) * 64) * Math.PI) / 4) * (1 + (random() - 0.5) * 10 ** (-16 * random())),
  () => 2 ** 20 * (random() - 0.5) * 3,
];
const special = [0, -0, 1, -1, NaN, Infinity, -Infinity, Number.MIN_VALUE, -Number.MIN_VALUE, Number.MAX_VALUE, Math.PI / 4, -Math.PI / 4, 0.3, 0.78125, 823_549, 823_550, 709.79, -745.14, 0.34657359, 1.0397207];
const anyAngle = () => (angles[Math.floor(random() * angles.length)] as () => number)();
const exponents: readonly (() => number)[] = [() => (random() - 0.5) * 4, () => (random() - 0.5) * 1500, () => (random() - 0.5) * 10 ** (random() * 12 - 12)];
const anyExponent = () => (exponents[Math.floor(random() * exponents.length)] as () => number)();

/** The first row in which two columns differ in any bit; of zeros the sign is not looked at. */
function firstDifference(a: Float64Array, b: Float64Array): number {
  return a.findIndex((value, row) => value !== b[row] && !Object.is(value, b[row]));
}

describe('an operation of the engine of a table', () => {
  it.each([['sin', anyAngle], ['cos', anyAngle], ['exp', anyExponent], ['sqrt', () => random() * 1e6 - 1e3], ['negate', anyAngle]] satisfies [UnaryOperation, () => number][])(
    '%s has the bits of the language, over 300 000 random and adversarial values',
    (operation, next) => {
      const from = column([...special, ...special.map((value) => -value), ...Array.from({ length: 300_001 }, next)]);
      const into = engine.allocate(from.length);
      const expected = new Float64Array(from.length);
      expect(engine.unary(operation, from, into, from.length)).toBe(true);
      evaluateUnary(operation, from, expected, from.length);
      const row = firstDifference(into, expected);
      expect(row < 0 ? null : { of: from[row], is: into[row], expected: expected[row] }).toBeNull();
    },
  );

  it.each(['add', 'subtract', 'multiply', 'divide', 'power'] satisfies BinaryOperation[])('%s has them too, of columns and of numbers', (operation) => {
    const a = column([...special, ...Array.from({ length: 1002 }, anyAngle)]);
    const b = column([...special.reverse(), ...Array.from({ length: 1002 }, anyAngle)]);
    const cases: Operands[] = [{ a, b, aNumber: null, bNumber: null }];
    for (const number of [2, 3, -0.7]) {
      const constant = column(new Float64Array(a.length).fill(number));
      cases.push({ a: constant, b, aNumber: number, bNumber: null }, { a, b: constant, aNumber: null, bNumber: number });
    }
    for (const operands of cases) {
      // An odd count, too, and every operation where it is done.
      for (const rows of [a.length, a.length - 1, 1]) {
        const into = engine.allocate(rows);
        const expected = new Float64Array(rows);
        const isDone = engine.binary(operation, operands, into, rows);
        expect(isDone).toBe(operation !== 'power' || operands.bNumber === 2 || operands.bNumber === 3);
        evaluateBinary(operation, operands, expected, rows);
        if (isDone) expect(firstDifference(into, expected)).toBe(-1);
      }
    }
  });

  it('is left to the language for a function it does not have, and for columns elsewhere', () => {
    const own = column([1, 2]);
    const elsewhere = new Float64Array(2);
    expect(engine.unary('tanh', own, own, 2)).toBe(false);
    expect(engine.unary('sin', elsewhere, own, 2)).toBe(false);
    expect(engine.binary('add', { a: own, b: elsewhere, aNumber: null, bNumber: null }, own, 2)).toBe(false);
    expect(engine.addErrors(own, { values: own, exact: elsewhere, weights: null }, 2)).toBe(false);
    expect(engine.addWeights(own, elsewhere, 2)).toBe(false);
  });
});

describe('sums of the engine of a table', () => {
  const blocks = (rows: number) => {
    const values = Array.from({ length: rows }, () => (random() - 0.5) * 10 ** (random() * 8));
    return { values: column(values), exact: column(values.map((value) => value * (1 + (random() - 0.5) * 1e-3))), weights: column(values.map(() => random() + 1e-3)) };
  };

  it.each([1, 2, 3, 127, 128, 129, 255, 1531, 2048])('are those of the language, bit for bit, of %i rows and again as many', (rows) => {
    for (const isWeighted of [true, false]) {
      const own = engine.allocate(stateLength);
      const plain = new Float64Array(stateLength);
      const ownWeights = engine.allocate(weightLength);
      const plainWeights = new Float64Array(weightLength);
      beginState(own);
      beginState(plain);
      for (let again = 0; again < 2; again += 1) {
        const { weights, ...columns } = blocks(rows);
        const given = { ...columns, weights: isWeighted ? weights : null };
        expect(engine.addErrors(own, given, rows)).toBe(true);
        addErrors(plain, given, rows);
        engine.addWeights(ownWeights, weights, rows);
        addWeights(plainWeights, weights, rows);
        expect(own).toEqual(plain);
        expect(ownWeights).toEqual(plainWeights);
      }
    }
  });

  it('name the first of several equal largest errors, whichever lane it is in', () => {
    for (const first of [4, 5]) {
      const { values, exact } = blocks(64);
      for (const row of [first, 6, 7, 33]) {
        values[row] = 3e9;
        exact[row] = 1e9;
      }
      const state = engine.allocate(stateLength);
      beginState(state);
      engine.addErrors(state, { values, exact, weights: null }, 64);
      expect([state[place.largest], state[place.largestRow], state[place.isBad]]).toEqual([2e9, first, 0]);
    }
  });

  it.each([NaN, Infinity, 1e160])('mark what has no norm: %d', (value) => {
    for (const row of [0, 1, 130]) {
      for (const name of ['values', 'exact'] as const) {
        const given = blocks(131);
        given[name][row] = value;
        const state = engine.allocate(stateLength);
        beginState(state);
        engine.addErrors(state, given, 131);
        expect(state[place.isBad]).toBe(1);
      }
      const { weights } = blocks(131);
      for (const bad of [0, -1, NaN, Infinity]) {
        weights[row] = bad;
        const state = engine.allocate(weightLength);
        engine.addWeights(state, weights, 131);
        expect(state[2]).toBe(1);
      }
    }
  });
});
