import type { SumPart } from './norm-part';

export interface CompensatedSum {
  add(value: number): void;
  /** Adds what another sum has gathered. */
  addPart(part: SumPart): void;
  part(): SumPart;
  value(): number;
}

/**
 * A sum that keeps what each addition rounds away and gives it back at the end; its error does not grow with the count.
 * A. Neumaier, Rundungsfehleranalyse einiger Verfahren zur Summation endlicher Summen, ZAMM 54 (1974) 39–51, method IV.
 */
export function createCompensatedSum(): CompensatedSum {
  // Kept in an array, where the engine does not make an object of every new value.
  const state = new Float64Array(2);
  const add = (value: number) => {
    const sum = state[0] as number;
    const next = sum + value;
    state[1] = (state[1] as number) + (Math.abs(sum) >= Math.abs(value) ? (sum - next) + value : (value - next) + sum);
    state[0] = next;
  };
  return {
    add,
    addPart({ sum, lost }) {
      add(sum);
      state[1] = (state[1] as number) + lost;
    },
    part: () => ({ sum: state[0] as number, lost: state[1] as number }),
    value: () => (state[0] as number) + (state[1] as number),
  };
}
