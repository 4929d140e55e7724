import type { ElementMember } from '../arrays/array-columns';
import { elementsOf } from '../arrays/array-columns';
import { refuseManyColumns } from '../column-limit';
import { listOf, memberOf, textOf, type SmallValue } from './small-value';

const numbers = /^H5T_(?:IEEE_F|STD_[IU]|NATIVE_(?!OPAQUE|B))/;
const words: Readonly<Record<string, string>> = {
  H5T_STRING: 'text', H5T_VLEN: 'lists of their own lengths', H5T_REFERENCE: 'references', H5T_ENUM: 'an enumeration', H5T_OPAQUE: 'opaque bytes', H5T_BITFIELD: 'bits',
};

/**
 * The numbers of one element of a type as the HDF5/JSON layout writes it, in the order of its values. `committed` are the types that others
 * refer to, by id.
 */
export function readElementType(type: SmallValue | undefined, committed: ReadonlyMap<string, SmallValue>, depth = 0): ElementMember[] {
  const unread = (problem: string): ElementMember[] => [{ suffix: '', problem }];
  if (depth > 16) return unread('types inside each other too deep');
  const name = textOf(type);
  if (name !== null) {
    if (name.startsWith('datatypes/')) return readElementType(memberOf(committed.get(name.slice('datatypes/'.length)), 'type'), committed, depth + 1);
    return numbers.test(name) ? number(name) : unread(`the type ${name}`);
  }
  const kind = textOf(memberOf(type, 'class'));
  if (kind === 'H5T_INTEGER' || kind === 'H5T_FLOAT') return number(textOf(memberOf(type, 'base')));
  if (kind === 'H5T_COMPOUND') {
    return listOf(memberOf(type, 'fields')).flatMap((field) => {
      const suffix = `.${textOf(memberOf(field, 'name')) ?? ''}`;
      return within(suffix, readElementType(memberOf(field, 'type'), committed, depth + 1));
    });
  }
  if (kind === 'H5T_ARRAY') {
    const dims = listOf(memberOf(type, 'dims')).map(Number);
    const base = readElementType(memberOf(type, 'base'), committed, depth + 1);
    const count = elementsOf(dims);
    if (!Number.isSafeInteger(count) || count < 1) return unread('arrays without a size');
    refuseManyColumns(count * base.length);
    return Array.from({ length: count }, (_, at) => within(`[${at}]`, base)).flat();
  }
  return unread(kind === null ? 'values without a type' : (words[kind] ?? `the type ${kind}`));
}

const number = (base: string | null): ElementMember[] => [{ suffix: '', problem: null, isSingle: base?.startsWith('H5T_IEEE_F32') === true }];

function within(prefix: string, members: readonly ElementMember[]): ElementMember[] {
  return members.map((member) => ({ ...member, suffix: `${prefix}${member.suffix}` }));
}
