export interface DecadeTick { log: number; digit: number; decade: number }

/** Ticks of a logarithmic axis from 10^from to 10^to: each decade with its digits 1 to 9, lowest first. */
export function decadeTicks(from: number, to: number): DecadeTick[] {
  const slack = 1e-9;
  const ticks: DecadeTick[] = [];
  for (let decade = Math.floor(from); decade <= Math.ceil(to); decade += 1) {
    for (let digit = 1; digit <= 9; digit += 1) {
      const log = decade + Math.log10(digit);
      if (log >= from - slack && log <= to + slack) ticks.push({ log, digit, decade });
    }
  }
  return ticks;
}
