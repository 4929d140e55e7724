const lowBits = 2 ** 26;
const exponents = 2100;

/**
 * Adds up to 2^24 doubles without any rounding: of each power of two the upper and the lower halves of the mantissas are
 * counted as whole numbers, which fit into a double.
 */
export function createExactSum() {
  const high = new Float64Array(exponents);
  const low = new Float64Array(exponents);
  const view = new DataView(new ArrayBuffer(8));
  return {
    add(value: number): void {
      if (value === 0) return;
      view.setFloat64(0, value);
      const bits = (view.getUint16(0) >>> 4) & 0x7ff;
      const exponent = Math.max(bits, 1);
      // |value| = mantissa · 2^(exponent − 1075), the mantissa a whole number below 2^53.
      const mantissa = (view.getUint32(0) & 0xfffff) * 2 ** 32 + view.getUint32(4) + (bits > 0 ? 2 ** 52 : 0);
      const signed = value < 0 ? -1 : 1;
      const rest = mantissa % lowBits;
      low[exponent] = (low[exponent] as number) + signed * rest;
      high[exponent] = (high[exponent] as number) + signed * ((mantissa - rest) / lowBits);
    },
    /** As a fraction of whole numbers: sum / 2^1074. */
    numerator(): bigint {
      let total = 0n;
      for (let exponent = 1; exponent < exponents; exponent += 1) {
        total += (BigInt(high[exponent] as number) * BigInt(lowBits) + BigInt(low[exponent] as number)) << BigInt(exponent - 1);
      }
      return total;
    },
  };
}

/** (value − exact)/exact for a value and an exact sum: the difference is taken in whole numbers. */
export function relativeError(value: number, numerator: bigint): number {
  const own = createExactSum();
  own.add(value);
  const difference = own.numerator() - numerator;
  const scale = 10n ** 25n;
  return Number((difference * scale) / numerator) / 1e25;
}
