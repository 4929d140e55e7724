import type { FieldProblem } from '@/lib/errors';
import { resolveSpacing } from '@/lib/numerics/spacing/resolve-spacing';
import type { CaseDefinition } from '../cases/definition';
import type { GridInput, Refinement } from './input';
import { statedSpacing } from './stated-spacing';

interface Surroundings {
  definition: CaseDefinition;
  refinement: Refinement;
  dimension: number;
  /** A file is there or can come, whose weights may tell the spacing. */
  canHaveFile: boolean;
}

/** Whether values or errors of the grid are typed, so that it needs no file. */
export function isTyped(grid: Pick<GridInput, 'values' | 'errors'>): boolean {
  return Object.keys(grid.values ?? {}).length > 0 || Object.keys(grid.errors ?? {}).length > 0;
}

/** What of a grid does not fit the case, each fault with the path of the member. */
export function checkGrid(grid: GridInput, around: Surroundings): FieldProblem[] {
  return [...checkSpacing(grid, around), ...checkQuantities(grid, around.definition), ...checkFields(grid, around.definition)];
}

function checkSpacing(grid: GridInput, { refinement, dimension, canHaveFile }: Omit<Surroundings, 'definition'>): FieldProblem[] {
  const counts = grid.cellsPerDirection;
  if (Array.isArray(counts) && counts.length !== dimension) {
    return [{ path: 'cellsPerDirection', message: `Grid ${grid.label}: ${counts.length} counts in ${dimension} dimensions. Give one for each.` }];
  }
  if (refinement === 'space-time') {
    return [...checkSpacing(grid, { refinement: 'time', dimension, canHaveFile }), ...checkSpacing(grid, { refinement: 'space', dimension, canHaveFile })];
  }
  if (canHaveFile && refinement === 'space' && !isTyped(grid)) return [];
  const spacing = resolveSpacing({ grids: [statedSpacing(grid)], refinement, dimension });
  if (spacing.ok) return [];
  return spacing.problems.map(({ found, expected }) => ({
    path: refinement === 'time' ? 'dt' : 'h', message: `Grid ${grid.label}: ${found}. Expected ${expected}.`,
  }));
}

function checkQuantities(grid: GridInput, { quantities }: CaseDefinition): FieldProblem[] {
  const declared = quantities.map(({ name }) => name);
  return Object.keys(grid.values ?? {}).filter((name) => !declared.includes(name)).map((name) => ({
    path: `values.${name}`, message: `Grid ${grid.label}: the case declares no quantity ${name}${list(declared)}`,
  }));
}

function checkFields(grid: GridInput, { fields }: CaseDefinition): FieldProblem[] {
  const declared = fields.map(({ field }) => field);
  return (['errors', 'iterativeError'] as const).flatMap((member) => Object.entries(grid[member] ?? {}).flatMap(([name, norms]) => {
    const field = fields.find((candidate) => candidate.field === name);
    if (!field) return [{ path: `${member}.${name}`, message: `Grid ${grid.label}: the case declares no field ${name}${list(declared)}` }];
    const known = field.norms.map(({ norm }) => norm);
    return Object.keys(norms).filter((norm) => !known.some((one) => one === norm)).map((norm) => ({
      path: `${member}.${name}.${norm}`, message: `Grid ${grid.label}: the case declares no norm ${norm} of ${name}${list(known)}`,
    }));
  }));
}

function list(declared: readonly string[]): string {
  return declared.length === 0 ? '.' : `; it declares ${declared.join(', ')}.`;
}
