export interface NamedFile { name: string; size: number }

/** Grids as they are told apart by the names of their files. Coarse to fine. */
export interface MatchableGrid { label: string; cells?: number; cellsPerDirection?: number | readonly number[] }

type Claims = readonly (string | null)[];
type Rule = (file: NamedFile, grid: MatchableGrid, dimension: number) => boolean;

/**
 * Which grid each file belongs to, file by file; null where a person must say so. The label in the name tells first. Then
 * the numbers in the names: cells per direction, cells in all, the number of the label; the reading that fits the most
 * files holds, and where two readings as good disagree on a file it has no grid. At last names that count the grids off,
 * and sizes in order. No grid gets two files: where two claim one, neither has it.
 */
export function matchFiles(files: readonly NamedFile[], grids: readonly MatchableGrid[], dimension: number): (string | null)[] {
  const found = claimsOf(hasLabel, { files, grids, dimension, found: files.map(() => null) }).slice();
  let isDisputed = false;
  for (;;) {
    const readings = [hasCellsPerDirection, hasCells, hasLabelNumber].map((rule) => claimsOf(rule, { files, grids, dimension, found }));
    const counts = readings.map((claims) => claims.filter((claim) => claim !== null).length);
    const best = readings.filter((_, index) => counts[index] === Math.max(...counts));
    const agreed = files.map((_, index) => agreedOn(best.map((claims) => claims[index] ?? null)));
    isDisputed ||= agreed.some((claim) => claim === 'disputed');
    const isNew = agreed.some((claim) => claim !== null && claim !== 'disputed');
    agreed.forEach((claim, index) => { if (claim !== null && claim !== 'disputed') found[index] = claim.label; });
    if (!isNew || isDisputed) break;
  }
  const restFiles = files.flatMap((file, index) => (found[index] === null ? [{ name: file.name, size: file.size, index }] : []));
  const restGrids = grids.filter(({ label }) => !found.includes(label));
  if (isDisputed || restFiles.length === 0 || restFiles.length !== restGrids.length) return found;
  const inOrder = byCount(restFiles, restGrids.length) ?? bySize(restFiles);
  inOrder?.forEach(({ index }, place) => { found[index] = restGrids[place]?.label ?? null; });
  return found;
}

interface Matching { files: readonly NamedFile[]; grids: readonly MatchableGrid[]; dimension: number; found: Claims }

/** What a rule says of the files without a grid, where it says one thing and no other file wants the same. */
function claimsOf(rule: Rule, { files, grids, dimension, found }: Matching): Claims {
  const free = grids.filter(({ label }) => !found.includes(label));
  const claims = files.map((file, index) => {
    const fitting = found[index] === null ? free.filter((grid) => rule(file, grid, dimension)) : [];
    return fitting.length === 1 ? (fitting[0]?.label ?? null) : null;
  });
  return claims.map((claim) => (claims.filter((other) => other === claim).length === 1 ? claim : null));
}

function agreedOn(claims: Claims): { label: string } | 'disputed' | null {
  const labels = [...new Set(claims.filter((claim) => claim !== null))];
  if (labels.length > 1) return 'disputed';
  return labels[0] === undefined ? null : { label: labels[0] };
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

/** Cells along each direction as stated, or as cells in all have them where all directions have as many. */
function hasCellsPerDirection({ name }: NamedFile, { cells, cellsPerDirection }: MatchableGrid, dimension: number): boolean {
  const root = cells === undefined ? 0 : Math.round(cells ** (1 / dimension));
  const counts = cellsPerDirection ?? (dimension > 1 && root ** dimension === cells ? root : []);
  const numbers = numbersIn(name);
  const wanted = typeof counts === 'number' ? [counts] : counts;
  return wanted.length > 0 && wanted.every((count) => numbers.includes(count));
}

function hasCells({ name }: NamedFile, { cells }: MatchableGrid): boolean {
  return cells !== undefined && numbersIn(name).includes(cells);
}

/** The one number of the label: "burgers_064.csv" for n64. */
function hasLabelNumber({ name }: NamedFile, { label }: MatchableGrid): boolean {
  const numbers = numbersIn(label);
  return numbers.length === 1 && numbersIn(name).includes(numbers[0] ?? -1);
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
