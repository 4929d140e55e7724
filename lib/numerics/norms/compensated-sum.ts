export interface CompensatedSum {
  add(value: number): void;
  value(): number;
}

/**
 * A sum that keeps what each addition rounds away and gives it back at the end; its error does not grow with the count.
 * A. Neumaier, Rundungsfehleranalyse einiger Verfahren zur Summation endlicher Summen, ZAMM 54 (1974) 39–51, method IV.
 */
export function createCompensatedSum(): CompensatedSum {
  let sum = 0;
  let lost = 0;
  return {
    add(value) {
      const next = sum + value;
      lost += Math.abs(sum) >= Math.abs(value) ? (sum - next) + value : (value - next) + sum;
      sum = next;
    },
    value: () => sum + lost,
  };
}
