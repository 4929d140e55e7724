import type { NamedArray } from '../arrays/array-columns';
import { refuseManyColumns } from '../column-limit';
import type { JsonElement } from '../json/json-element';
import type { ReasonCollector } from '../reason-collector';
import { createDatasetValues, type DatasetValues, type ValueKeeping } from './dataset-values';
import { findDatasetPaths } from './dataset-paths';
import { readElementType } from './element-type';
import { createSmallValues, listOf, memberOf, textOf, type SmallValue } from './small-value';

export interface Hdf5Array extends NamedArray {
  /** Null where the dataset has no values. */
  values: DatasetValues | null;
}

export interface Hdf5Document {
  /** What takes a member of the document; null where HDF5/JSON has none of that name. */
  member: (name: string) => JsonElement | null;
  /** Datasets by path, once the document has ended. */
  arrays(): Hdf5Array[];
}

interface Dataset { alias: SmallValue; type: SmallValue; shape: SmallValue; values: DatasetValues | null }

const ignore = () => undefined;

/** Gathers a file in the HDF Group's open HDF5/JSON layout (1.0 to 1.1.1), whose members may stand in any order. */
export function createHdf5Document(keeping: ValueKeeping, reasons: ReasonCollector): Hdf5Document {
  const small = createSmallValues(reasons);
  const datasets = new Map<string, Dataset>();
  const links = new Map<string, SmallValue[]>();
  const types = new Map<string, SmallValue>();
  let root: string | null = null;

  /** An object of objects by id. */
  const byId = (one: (id: string) => JsonElement): JsonElement => ({ scalar: ignore, open: (kind) => (kind === 'object' ? { child: one, close: ignore } : null) });
  const objectOf = (child: (name: string) => JsonElement | null): JsonElement => ({ scalar: ignore, open: (kind) => (kind === 'object' ? { child, close: ignore } : null) });

  const dataset = (id: string): JsonElement => {
    const made: Dataset = { alias: null, type: null, shape: null, values: null };
    datasets.set(id, made);
    refuseManyColumns(datasets.size);
    return objectOf((name) => {
      switch (name) {
        case 'alias': return small((value) => { made.alias = value; });
        case 'type': return small((value) => { made.type = value; });
        case 'shape': return small((value) => { made.shape = value; });
        case 'value': return (made.values = createDatasetValues(keeping)).element;
        default: return null;
      }
    });
  };
  const group = (id: string): JsonElement => objectOf((name) => (name === 'links' ? small((value) => { links.set(id, listOf(value)); }) : null));
  const members: Readonly<Record<string, JsonElement>> = {
    root: small((value) => { root = textOf(value); }),
    groups: byId(group),
    datasets: byId(dataset),
    datatypes: byId((id) => small((value) => types.set(id, value))),
  };

  return {
    member: (name) => (Object.hasOwn(members, name) ? members[name] ?? null : null),
    arrays() {
      const aliases = new Map([...datasets].map(([id, { alias }]) => [id, listOf(alias).flatMap((each) => textOf(each) ?? [])]));
      return findDatasetPaths({ root, links, aliases }, datasets.keys()).flatMap(({ path, id }) => {
        const found = datasets.get(id);
        return found ? [{ path, dims: readDims(found.shape), members: readElementType(found.type, types), values: found.values }] : [];
      });
    },
  };
}

/** No dimensions for a scalar; one of no length where there is no value, or no sensible shape. */
function readDims(shape: SmallValue): number[] {
  const kind = textOf(memberOf(shape, 'class'));
  if (kind === 'H5S_SCALAR') return [];
  const dims = listOf(memberOf(shape, 'dims'));
  const isShape = kind !== 'H5S_NULL' && dims.length > 0 && dims.every((dim) => typeof dim === 'number' && Number.isSafeInteger(dim) && dim >= 0);
  return isShape ? dims.map(Number) : [0];
}
