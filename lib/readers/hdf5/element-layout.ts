import type { Metadata } from 'h5wasm';
import { elementsOf, type ElementMember } from '../arrays/array-columns';
import { refuseManyColumns } from '../column-limit';

type Decode = (view: DataView, at: number) => number;

/** A number of an element: where in its bytes, and how to read it. */
export interface PlacedMember extends ElementMember {
  offset: number;
  decode: Decode;
}

/** Classes of types by their numbers in the HDF5 library (H5Tpublic.h). */
const [integerClass, floatClass, compoundClass, arrayClass] = [0, 1, 6, 10];
const words: Readonly<Record<number, string>> = {
  2: 'times', 3: 'text', 4: 'bits', 5: 'opaque bytes', 7: 'references', 8: 'an enumeration', 9: 'lists of their own lengths',
};

interface Leaf { suffix: string; offset: number; type: Pick<Metadata, 'type' | 'size' | 'signed' | 'littleEndian'> }

function leavesOf(type: Metadata, suffix: string, offset: number): Leaf[] {
  if (type.type === compoundClass && type.compound_type) {
    return type.compound_type.members.flatMap((member) => leavesOf(member, `${suffix}.${member.name}`, offset + member.offset));
  }
  if (type.type === arrayClass && type.array_type) {
    const base = type.array_type;
    const count = elementsOf(base.shape ?? []);
    refuseManyColumns(count);
    return Array.from({ length: count }, (_, at) => leavesOf(base, `${suffix}[${at}]`, offset + at * base.size)).flat();
  }
  return [{ suffix, offset, type }];
}

/** The numbers of one element of a dataset, as the library hands its bytes over. */
export function layOutElement(type: Metadata): PlacedMember[] {
  const leaves = leavesOf(type, '', 0);
  refuseManyColumns(leaves.length);
  const isNumber = ({ type: { type: kind } }: Leaf) => kind === integerClass || kind === floatClass;
  // Of one byte order throughout, the library turns it; of both, the bytes stay as they are.
  const isTurned = leaves.filter(isNumber).every((leaf) => !leaf.type.littleEndian);
  return leaves.map(({ suffix, offset, type: leaf }) => {
    const decode = decoderOf(leaf, leaf.littleEndian || isTurned);
    const bits = `${leaf.size * 8}-bit ${leaf.type === floatClass ? 'floating-point numbers' : 'integers'}`;
    return { suffix, offset, decode: decode ?? (() => NaN), isSingle: leaf.type === floatClass && leaf.size === 4, problem: decode ? null : (words[leaf.type] ?? bits) };
  });
}

function decoderOf({ type, size, signed }: Leaf['type'], little: boolean): Decode | null {
  if (type === floatClass && size === 8) return (view, at) => view.getFloat64(at, little);
  if (type === floatClass && size === 4) return (view, at) => view.getFloat32(at, little);
  if (type !== integerClass) return null;
  switch (size) {
    case 1: return signed ? (view, at) => view.getInt8(at) : (view, at) => view.getUint8(at);
    case 2: return signed ? (view, at) => view.getInt16(at, little) : (view, at) => view.getUint16(at, little);
    case 4: return signed ? (view, at) => view.getInt32(at, little) : (view, at) => view.getUint32(at, little);
    case 8: return signed ? (view, at) => Number(view.getBigInt64(at, little)) : (view, at) => Number(view.getBigUint64(at, little));
    default: return null;
  }
}
