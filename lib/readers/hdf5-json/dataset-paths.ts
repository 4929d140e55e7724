import { memberOf, textOf, type SmallValue } from './small-value';

export interface Hdf5Groups {
  root: string | null;
  /** Links by the id of their group. */
  links: ReadonlyMap<string, SmallValue[]>;
  /** Other paths by which datasets say that they go, by id. */
  aliases: ReadonlyMap<string, string[]>;
}

/** Groups inside each other; paths of more would be as long as the file. */
const deepest = 64;

interface Link { title: string; collection: string | null; id: string | null; softPath: string | null }

function readLink(value: SmallValue): Link[] {
  const title = textOf(memberOf(value, 'title'));
  if (title === null) return [];
  const isSoft = textOf(memberOf(value, 'class')) === 'H5L_TYPE_SOFT';
  return [{
    title, collection: textOf(memberOf(value, 'collection')), id: textOf(memberOf(value, 'id')), softPath: isSoft ? textOf(memberOf(value, 'h5path')) : null,
  }];
}

/**
 * The paths of datasets, in the order of the links from the root: of hard links by id and of soft ones by the path they
 * name, each group once. A dataset that no link leads to goes by its alias, else by its id. External links lead nowhere.
 */
export function findDatasetPaths({ root, links, aliases }: Hdf5Groups, datasets: Iterable<string>): { path: string; id: string }[] {
  const found: { path: string; id: string }[] = [];
  const soft: { path: string; target: string }[] = [];
  const visited = new Set<string>();
  const waiting: { group: string; path: string; depth: number }[] = root === null ? [] : [{ group: root, path: '', depth: 0 }];
  for (const { group, path, depth } of waiting) {
    if (visited.has(group) || depth > deepest) continue;
    visited.add(group);
    for (const { title, collection, id, softPath } of (links.get(group) ?? []).flatMap(readLink)) {
      const place = path === '' ? title : `${path}/${title}`;
      if (softPath !== null) soft.push({ path: place, target: absolute(path, softPath) });
      else if (collection === 'datasets' && id !== null) found.push({ path: place, id });
      // The loop takes what is added to its list meanwhile.
      else if (collection === 'groups' && id !== null) waiting.push({ group: id, path: place, depth: depth + 1 });
    }
  }
  const byPath = new Map(found.map(({ path, id }) => [path, id]));
  for (const { path, target } of soft) {
    const id = byPath.get(target);
    if (id !== undefined) found.push({ path, id });
  }
  const linked = new Set(found.map(({ id }) => id));
  for (const id of datasets) {
    if (linked.has(id)) continue;
    const paths = aliases.get(id) ?? [];
    for (const path of paths.length > 0 ? paths : [id]) found.push({ path: path.replace(/^\/+/, ''), id });
  }
  return found;
}

function absolute(group: string, target: string): string {
  return target.startsWith('/') ? target.replace(/^\/+/, '') : group === '' ? target : `${group}/${target}`;
}
