const smallestPower = -342;
const largestPower = 308;

const bitsOf = (value: bigint) => value.toString(2).length;

let known: Uint8Array | null = null;

/**
 * 5^q as 128 bits, the upper 64 first, for every power of ten that a double can need: rounded down where they are whole, up
 * where they are fractions (D. Lemire, Number parsing at a gigabyte per second, 2021, section 5).
 */
export function powersOfFive(): Uint8Array {
  known ??= computePowers();
  return known;
}

function computePowers(): Uint8Array {
  const view = new DataView(new ArrayBuffer((largestPower - smallestPower + 1) * 16));
  for (let q = smallestPower; q <= largestPower; q += 1) {
    const bits = q < 0 ? fractionBits(5n ** BigInt(-q), q) : wholeBits(5n ** BigInt(q));
    const place = (q - smallestPower) * 16;
    view.setBigUint64(place, bits >> 64n, true);
    view.setBigUint64(place + 8, BigInt.asUintN(64, bits), true);
  }
  return new Uint8Array(view.buffer);
}

function wholeBits(power: bigint): bigint {
  const excess = BigInt(bitsOf(power) - 128);
  return excess < 0n ? power << -excess : power >> excess;
}

function fractionBits(power: bigint, q: number): bigint {
  const size = BigInt(bitsOf(power - 1n));
  if (q >= -27) return (1n << (size + 127n)) / power + 1n;
  const bits = (1n << (2n * size + 128n)) / power + 1n;
  return bits >> BigInt(Math.max(0, bitsOf(bits) - 128));
}
