const chunk = 65_536;

export interface NumberSpool {
  add(value: number, digits: number): void;
  length(): number;
  /** Most significant digits of any number added. */
  digits(): number;
  copy(from: number, count: number, into: Float64Array): void;
}

/** Holds a column of unknown length without ever moving what it has. */
export function createNumberSpool(): NumberSpool {
  const chunks: Float64Array[] = [];
  let length = 0;
  let most = 0;
  return {
    add(value, digits) {
      if (length % chunk === 0) chunks.push(new Float64Array(chunk));
      (chunks[chunks.length - 1] as Float64Array)[length % chunk] = value;
      length += 1;
      if (digits > most) most = digits;
    },
    length: () => length,
    digits: () => most,
    copy(from, count, into) {
      for (let i = 0; i < count; i += 1) into[i] = (chunks[Math.floor((from + i) / chunk)] as Float64Array)[(from + i) % chunk] as number;
    },
  };
}
