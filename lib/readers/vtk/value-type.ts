/** The numbers of VTK's arrays, and how to read a run of them. */
export interface ValueType {
  name: string;
  bytes: number;
  isInteger: boolean;
  /** Reads `count` values into the beginning of `into`. */
  read(view: DataView, count: number, littleEndian: boolean, into: Float64Array): void;
}

type Take = (view: DataView, at: number, littleEndian: boolean) => number;

const high = 2 ** 32;
const wide = (isSigned: boolean): Take => (view, at, littleEndian) => {
  const [low, top] = littleEndian ? [at, at + 4] : [at + 4, at];
  return (isSigned ? view.getInt32(top, littleEndian) : view.getUint32(top, littleEndian)) * high + view.getUint32(low, littleEndian);
};

function valueType(name: string, bytes: number, take: Take): ValueType {
  return {
    name, bytes, isInteger: !name.startsWith('Float'),
    read(view, count, littleEndian, into) {
      for (let i = 0; i < count; i += 1) into[i] = take(view, i * bytes, littleEndian);
    },
  };
}

const types: readonly ValueType[] = [
  valueType('Float64', 8, (view, at, littleEndian) => view.getFloat64(at, littleEndian)),
  valueType('Float32', 4, (view, at, littleEndian) => view.getFloat32(at, littleEndian)),
  valueType('Int8', 1, (view, at) => view.getInt8(at)),
  valueType('UInt8', 1, (view, at) => view.getUint8(at)),
  valueType('Int16', 2, (view, at, littleEndian) => view.getInt16(at, littleEndian)),
  valueType('UInt16', 2, (view, at, littleEndian) => view.getUint16(at, littleEndian)),
  valueType('Int32', 4, (view, at, littleEndian) => view.getInt32(at, littleEndian)),
  valueType('UInt32', 4, (view, at, littleEndian) => view.getUint32(at, littleEndian)),
  valueType('Int64', 8, wide(true)),
  valueType('UInt64', 8, wide(false)),
];

/** Integers beyond 2⁵³ become the nearest double. Undefined for a type that is not of numbers. */
export function findValueType(name: string | undefined): ValueType | undefined {
  return types.find((type) => type.name === name);
}
