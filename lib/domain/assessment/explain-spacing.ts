import { noteSpacing } from '@/lib/numerics/spacing/note-spacing';
import type { SpacingNote } from '@/lib/numerics/spacing/spacing-types';
import { formatCount } from '../numbers/format-count';
import { formatValue } from '../numbers/format-value';
import { cellCount } from '../studies/cell-count';
import type { GridInput } from '../studies/input';
import { hasNodes, type Box } from './has-nodes';
import type { Assessment } from './schema';

type Stated = Pick<GridInput, 'label' | 'cells' | 'cellsPerDirection'>;

/** Digits that show a difference of 1e-6. */
const weightDigits = 9;

interface Around { dimension: number; volume?: number | null; box?: Box | null }

/**
 * What of the files of a study does not fit the cells stated, the domain, or each other: rows that are not cells, nodes
 * counted as cells, coordinates that repeat, and weights that add up to different sums. It wants a look and decides nothing.
 */
export function explainSpacing(grids: readonly Stated[], inputs: Assessment['inputs'], { dimension, volume = null, box = null }: Around): string[] {
  const known = inputs.map(({ label, rows, weightSum }) => {
    const grid = grids.find((each) => each.label === label);
    return { label, cells: (grid && cellCount(grid, dimension)) ?? undefined, rows, weightSum: weightSum ?? undefined };
  });
  const notes = noteSpacing(known, volume);
  const of = (code: SpacingNote['code']) => notes.filter((note) => note.code === code);
  const [first, rows, weights, total] = [inputs.find(({ weightSum }) => typeof weightSum === 'number'), of('rows-differ-from-cells'), of('weights-differ'), of('weights-differ-from-volume')];
  return [
    ...rows.slice(0, 1).map(({ label, found, expected }) => (
      `The file of ${label} has ${formatCount(found)} rows, where ${formatCount(expected)} cells are stated${others(rows)}: right for nodes or quadrature points, else a part is missing or twice there.`
    )),
    ...nodesAsCells(known, inputs, box),
    ...repeatedCoordinates(inputs),
    ...weights.slice(0, 1).map(({ label, found, expected }) => (
      `The weights of ${label} add up to ${print(found)}, those of ${first?.label} to ${print(expected)}${others(weights)}: the grids may not cover the same domain.`
    )),
    ...total.map(({ label, found, expected }) => (
      `The weights of ${label} add up to ${print(found)}, while the box of the problem measures ${print(expected)}: right where they carry a thickness, else the grid may not cover the domain.`
    )),
  ];
}

function nodesAsCells(known: readonly { label: string; cells?: number; rows: number }[], inputs: Assessment['inputs'], box: Box | null): string[] {
  const nodes = known.filter(({ label, cells, rows }) => {
    const mesh = inputs.find((input) => input.label === label)?.mesh;
    return cells === rows && mesh !== undefined && hasNodes(mesh, box);
  });
  return nodes.slice(0, 1).map(({ label, rows }) => (
    `The ${formatCount(rows)} rows of ${label} reach the ends of the domain, as nodes do, and as many cells are stated${others(nodes)}: nodes counted as cells bias the orders of coarse grids.`
  ));
}

/** Cells of partitions written by two processes, ghost cells, nodes written once for each element. */
function repeatedCoordinates(inputs: Assessment['inputs']): string[] {
  const repeated = inputs.filter(({ mesh }) => (mesh?.duplicates.rows ?? 0) > 0);
  return repeated.slice(0, 1).map(({ label, mesh }) => {
    const { rows, oneIn } = mesh?.duplicates ?? { rows: 0, oneIn: 1 };
    const many = oneIn > 1 ? `about ${formatCount(rows)} rows (estimated from one in ${formatCount(oneIn)})` : rows === 1 ? '1 row' : `${formatCount(rows)} rows`;
    return `The file of ${label} has ${many} at the coordinates of an earlier one${others(repeated)}: cells of several partitions, ghost cells, or nodes written with each element count twice.`;
  });
}

function others(notes: readonly unknown[]): string {
  const more = notes.length - 1;
  return more === 0 ? '' : `, and ${more} more ${more === 1 ? 'grid differs' : 'grids differ'}`;
}

function print(sum: number): string {
  return formatValue(sum, Math.abs(sum) * 10 ** (2 - weightDigits));
}
