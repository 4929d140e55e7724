export interface NamedFile { name: string; size: number }

/** Grids as they are told apart by the names of their files. Coarse to fine. */
export interface MatchableGrid { label: string; cells?: number; cellsPerDirection?: number | readonly number[] }

/**
 * Which grid each file belongs to, file by file; null where a person must say so. Strongest sign first: the label in the
 * name, the cells per direction, the cells in all, numbers that count the grids off, at last the sizes in order. No grid
 * gets two files: where two claim one, neither has it.
 */
export function matchFiles(files: readonly NamedFile[], grids: readonly MatchableGrid[]): (string | null)[] {
  const found: (string | null)[] = files.map(() => null);
  for (const rule of [hasLabel, hasCellsPerDirection, hasCells]) {
    const free = grids.filter(({ label }) => !found.includes(label));
    const claims = files.map((file, index) => (found[index] === null ? onlyOne(free.filter((grid) => rule(file, grid))) : null));
    claims.forEach((grid, index) => {
      if (grid && claims.filter((other) => other === grid).length === 1) found[index] = grid.label;
    });
  }
  const restFiles = files.flatMap((file, index) => (found[index] === null ? [{ name: file.name, size: file.size, index }] : []));
  const restGrids = grids.filter(({ label }) => !found.includes(label));
  if (restFiles.length === 0 || restFiles.length !== restGrids.length) return found;
  const inOrder = byCount(restFiles, restGrids.length) ?? bySize(restFiles);
  inOrder?.forEach(({ index }, place) => { found[index] = restGrids[place]?.label ?? null; });
  return found;
}

function onlyOne<T>(candidates: readonly T[]): T | null {
  return candidates.length === 1 ? (candidates[0] ?? null) : null;
}

const withoutEnding = (name: string) => name.replace(/(\.[A-Za-z]{2,4})?(\.gz)?$/i, '');

/** Whole numbers in a name, its ending apart: "burgers_032.csv.gz" has 32. */
function numbersIn(name: string): number[] {
  return [...withoutEnding(name).matchAll(/\d+/g)].map(([digits]) => Number(digits));
}

/** The label stands in the name as a word of its own: n64 in "run-n64.csv", not in "n640.csv". */
function hasLabel({ name }: NamedFile, { label }: MatchableGrid): boolean {
  const escaped = label.toLowerCase().replace(/[.*+?^${}()|[\]\\]/g, '\\$&');
  return new RegExp(`(^|[^a-z0-9])${escaped}($|[^a-z0-9])`).test(withoutEnding(name).toLowerCase());
}

function hasCellsPerDirection({ name }: NamedFile, { cellsPerDirection }: MatchableGrid): boolean {
  if (cellsPerDirection === undefined) return false;
  const counts = typeof cellsPerDirection === 'number' ? [cellsPerDirection] : cellsPerDirection;
  const numbers = numbersIn(name);
  return counts.every((count) => numbers.includes(count));
}

function hasCells({ name }: NamedFile, { cells }: MatchableGrid): boolean {
  return cells !== undefined && numbersIn(name).includes(cells);
}

type IndexedFile = NamedFile & { index: number };

/**
 * Files whose names count from 1 or 0 to the number of grids, coarse to fine: the count runs as the sizes do, and where
 * the sizes of files packed alike do not tell, nothing is claimed.
 */
function byCount(files: readonly IndexedFile[], grids: number): IndexedFile[] | null {
  const numbers = files.map(({ name }) => numbersIn(name));
  const places = Math.min(...numbers.map(({ length }) => length));
  for (let place = 0; place < places; place++) {
    const counted = files.map((file, index) => ({ file, number: numbers[index]?.[place] ?? 0 })).sort((a, b) => a.number - b.number);
    const first = counted[0]?.number ?? 0;
    const isCount = (first === 0 || first === 1) && counted.every(({ number }, step) => number === first + step);
    if (!isCount || counted.length !== grids) continue;
    const ordered = counted.map(({ file }) => file);
    if (growsWithin(ordered)) return ordered;
    const reversed = [...ordered].reverse();
    if (growsWithin(reversed)) return reversed;
  }
  return null;
}

const isPacked = ({ name }: NamedFile) => /\.gz$/i.test(name);

/** Sizes grow from file to file among those packed alike, with at least two of a kind to tell. */
function growsWithin(files: readonly NamedFile[]): boolean {
  const kinds = [files.filter(isPacked), files.filter((file) => !isPacked(file))];
  return kinds.some(({ length }) => length >= 2)
    && kinds.every((kind) => kind.every((file, index) => index === 0 || file.size > (kind[index - 1]?.size ?? 0)));
}

/** Finer grids write longer files: tells only where all are packed alike and no two are of one size. */
function bySize(files: readonly IndexedFile[]): IndexedFile[] | null {
  const ordered = [...files].sort((a, b) => a.size - b.size);
  const areAlike = new Set(files.map(isPacked)).size === 1 && new Set(files.map(({ size }) => size)).size === files.length;
  return areAlike ? ordered : null;
}
