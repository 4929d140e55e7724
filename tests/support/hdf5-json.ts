interface Written { path: string; type?: unknown; dims?: number[] | null; value: unknown; shape?: unknown }

const double = { class: 'H5T_FLOAT', base: 'H5T_IEEE_F64LE' };

/** Ids that look like those of files: their order is not that of the names. */
const idOf = (path: string) => `${Buffer.from(path).reverse().toString('hex').padEnd(8, '0').slice(0, 8)}-${Buffer.from(path).toString('hex')}`;

export interface Hdf5JsonOptions { linksLast?: boolean; soft?: Record<string, string>; noLinks?: boolean }

/** A file in the open HDF5/JSON layout, as the text of its specification says, with datasets by path. */
export function writeHdf5Json(datasets: readonly Written[], { linksLast = false, soft = {}, noLinks = false }: Hdf5JsonOptions = {}): string {
  const folders = new Map<string, unknown[]>([['', []]]);
  const linksOf = (folder: string): unknown[] => {
    const known = folders.get(folder);
    if (known) return known;
    const made: unknown[] = [];
    folders.set(folder, made);
    const [parent, title] = split(folder);
    linksOf(parent).push({ class: 'H5L_TYPE_HARD', title, collection: 'groups', id: idOf(`${folder}/`) });
    return made;
  };
  for (const { path } of datasets) {
    const [folder, title] = split(path);
    linksOf(folder).push({ class: 'H5L_TYPE_HARD', title, collection: 'datasets', id: idOf(path) });
  }
  for (const [title, h5path] of Object.entries(soft)) linksOf('').push({ class: 'H5L_TYPE_SOFT', title, h5path });
  const groups = Object.fromEntries([...folders].map(([folder, links]) => [idOf(`${folder}/`), { alias: [`/${folder}`], attributes: [{ name: 'note', value: [1, 2] }], links }]));
  const written = Object.fromEntries(datasets.map(({ path, type = double, dims, value, shape }) => [idOf(path), {
    alias: [`/${path}`], type, shape: shape ?? (dims === null ? { class: 'H5S_SCALAR' } : { class: 'H5S_SIMPLE', dims: dims ?? [(value as unknown[]).length] }), value,
  }]));
  const [head, rest] = [{ apiVersion: '1.1.1', id: 'f', root: idOf('/') }, noLinks ? {} : { groups }];
  return JSON.stringify(linksLast ? { datasets: written, ...rest, ...head } : { ...head, ...rest, datasets: written });
}

function split(path: string): [string, string] {
  const at = path.lastIndexOf('/');
  return at < 0 ? ['', path] : [path.slice(0, at), path.slice(at + 1)];
}
