import { buildNode, type Scope } from './build-node';
import { ExpressionProblem } from './expression-problem';
import { isFunctionName } from './functions';
import { createGraph } from './graph';
import type { Graph, Node, Variable } from './node';
import { parseTree, type Tree } from './parse-tree';

/** Bounds on the work of reading a set, far beyond what anybody writes: a set at all of them takes a second. */
const most = { names: 300, characters: 100_000, levels: 2500, chain: 100, derivedNodes: 300_000, errors: 20, listed: 30 } as const;

export interface ExpressionSet {
  /** Numbers, or expressions of other constants and of the coordinates. */
  constants: Readonly<Record<string, number | string>>;
  /** The exact fields. */
  fields: Readonly<Record<string, string>>;
  /** More expressions of constants and fields, such as what a column of a file is compared with. */
  compared?: Readonly<Record<string, string>>;
  variables: readonly Variable[];
}

interface ExpressionError {
  /** The constant, field or comparison it stands in. */
  name: string;
  /** The character, counted from 1. */
  position: number;
  message: string;
}

interface CompiledExpressions {
  graph: Graph;
  variables: readonly Variable[];
  /** Null prototype: any field name is a plain key. */
  fields: Record<string, Node>;
  compared: Record<string, Node>;
}

export type CompileResult = { ok: true; compiled: CompiledExpressions } | { ok: false; errors: ExpressionError[] };

/**
 * Reads constants, exact fields and comparisons into one shared graph, or says for each what is wrong and at which
 * character. Names stand for a constant, else an exact field, else a coordinate or pi; circles are refused.
 */
export function compileExpressions(set: ExpressionSet): CompileResult {
  const graph = createGraph();
  const sources = new Map<string, string>();
  for (const [name, source] of Object.entries(set.fields)) sources.set(name, source);
  for (const [name, value] of Object.entries(set.constants)) sources.set(name, typeof value === 'number' ? literal(value) : value);
  const excess = findExcess(sources, set.compared ?? {});
  if (excess !== null) return { ok: false, errors: [excess] };

  const errors: ExpressionError[] = [];
  let levels = 0;
  let derivedNodes = 0;
  const attempt = <T>(name: string, run: () => T): T | null => {
    const before = levels;
    try {
      return run();
    } catch (problem) {
      if (!(problem instanceof ExpressionProblem)) throw problem;
      levels = before;
      if (errors.length < most.errors) errors.push({ name, position: problem.position, message: problem.message });
      return null;
    }
  };

  // All are parsed before any is built: a parser that is called from within another's parts would run out of stack.
  const trees = new Map<string, Tree | null>();
  for (const [name, source] of sources) trees.set(name, attempt(name, () => parseTree(source)));
  const built = new Map<string, Node | null>();
  const underWay: string[] = [];
  const buildNamed = (name: string, tree: Tree | null): Node | null => {
    const known = built.get(name);
    if (known !== undefined) return known;
    underWay.push(name);
    const node = tree === null ? null : attempt(name, () => {
      checkName(name, set);
      return buildNode(graph, tree, scope);
    });
    underWay.pop();
    built.set(name, node);
    return node;
  };

  const scope: Scope = {
    variables: set.variables,
    isField: (name) => Object.hasOwn(set.fields, name) && !Object.hasOwn(set.constants, name),
    names: () => [...[...sources.keys()].slice(0, most.listed), ...set.variables, 'pi'],
    enter(position) {
      levels += 1;
      if (levels > most.levels) throw new ExpressionProblem(position, `More than ${most.levels} operations inside each other. Write it as a sum or product of shorter parts.`);
    },
    leave() {
      levels -= 1;
    },
    spend(nodes, position) {
      derivedNodes += nodes;
      if (derivedNodes > most.derivedNodes) throw new ExpressionProblem(position, 'The derivatives asked for are too large to be formed. Ask for fewer, or of simpler fields.');
    },
    find(name, position) {
      const tree = trees.get(name);
      if (tree === undefined) return findOwn(graph, name, set.variables);
      if (underWay.includes(name)) {
        const circle = [...underWay.slice(underWay.indexOf(name)), name].join(' → ');
        throw new ExpressionProblem(position, `This goes round in a circle: ${circle}.`);
      }
      if (underWay.length >= most.chain) throw new ExpressionProblem(position, `More than ${most.chain} names lead from one to the next here. Put some of them together.`);
      const node = buildNamed(name, tree);
      if (node === null) throw new ExpressionProblem(position, `${name} has an error of its own.`);
      return node;
    },
  };

  for (const [name, tree] of trees) buildNamed(name, tree);
  const compared = Object.create(null) as Record<string, Node>;
  for (const [name, source] of Object.entries(set.compared ?? {})) {
    const node = attempt(name, () => buildNode(graph, parseTree(source), scope));
    if (node !== null) compared[name] = node;
  }
  if (errors.length > 0) return { ok: false, errors };

  const fields = Object.create(null) as Record<string, Node>;
  for (const name of Object.keys(set.fields)) {
    const node = built.get(name);
    if (node) fields[name] = node;
  }
  return { ok: true, compiled: { graph, variables: set.variables, fields, compared } };
}

/** Whether there is more than is read at all, told at the first that is too much. */
function findExcess(sources: ReadonlyMap<string, string>, compared: Readonly<Record<string, string>>): ExpressionError | null {
  const all = [...sources, ...Object.entries(compared)];
  const beyond = all[most.names];
  if (beyond !== undefined) {
    return { name: beyond[0], position: 1, message: `There are ${all.length} constants and fields; at most ${most.names} are read. Leave out what is not used.` };
  }
  let characters = 0;
  for (const [name, source] of all) {
    characters += source.length;
    if (characters > most.characters) {
      return { name, position: 1, message: `The expressions have more than ${most.characters} characters together. Leave out what is not used.` };
    }
  }
  return null;
}

function findOwn(graph: Graph, name: string, variables: readonly Variable[]): Node | null {
  const variable = variables.find((each) => each === name);
  if (variable !== undefined) return graph.variable(variable);
  return name === 'pi' ? graph.number(Math.PI) : null;
}

function literal(value: number): string {
  if (!Number.isFinite(value)) throw new RangeError(`compileExpressions: a constant is ${value}`);
  return String(value);
}

function checkName(name: string, set: ExpressionSet): void {
  if (set.variables.some((variable) => variable === name)) {
    throw new ExpressionProblem(1, `“${name}” is a coordinate; give the field or constant another name.`);
  }
  if (!Object.hasOwn(set.constants, name)) return;
  if (!/^[A-Za-z_][A-Za-z0-9_]*$/.test(name)) {
    throw new ExpressionProblem(1, `“${name}” cannot be the name of a constant: letters, digits and _ only, a letter first.`);
  }
  if (isFunctionName(name) || ['x', 'y', 'z', 't', 'd'].includes(name)) {
    throw new ExpressionProblem(1, `“${name}” has a meaning of its own; give the constant another name.`);
  }
  if (Object.hasOwn(set.fields, name)) throw new ExpressionProblem(1, `“${name}” is a field and a constant; rename one of them.`);
}
